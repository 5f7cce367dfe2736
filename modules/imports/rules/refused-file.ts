import type { FileRefusal } from "@/modules/imports/model";

/** A whole file that cannot be read, with the sentence for the person who brought it. */
export class RefusedFile extends Error {
  constructor(readonly refusal: FileRefusal) {
    super(refusal.reason);
    this.name = "RefusedFile";
  }
}

/** The refusal of a whole file as an error to throw. */
export function refuseFile(
  code: FileRefusal["code"],
  reason: string,
  mend: string,
  line: number | null = null,
): RefusedFile {
  return new RefusedFile({ code, reason, mend, line });
}
