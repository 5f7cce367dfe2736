import type { FileKind } from "@/modules/imports/model";
import { type RefusedFile, refuseFile } from "@/modules/imports/rules/refused-file";

const TEXT_NAMES = ["csv", "txt", "tsv", "tab"];
const MACRO_NAMES = ["xlsm", "xltm", "xlam"];

/** First bytes of files that people mistake for tables of readings. */
const OTHER_KINDS: readonly { magic: string; name: string }[] = [
  { magic: "25504446", name: "a PDF document" },
  { magic: "89504e47", name: "a picture (PNG)" },
  { magic: "ffd8ff", name: "a picture (JPEG)" },
  { magic: "47494638", name: "a picture (GIF)" },
  { magic: "1f8b", name: "a compressed file (gzip)" },
  { magic: "377abcaf271c", name: "a compressed file (7z)" },
  { magic: "526172211a07", name: "a compressed file (RAR)" },
  { magic: "53514c69746520666f726d6174", name: "a database" },
  { magic: "7f454c46", name: "a program" },
  { magic: "4d5a9000", name: "a program" },
];

const begins = (head: Buffer, magic: string): boolean =>
  head.subarray(0, magic.length / 2).toString("hex") === magic;

export const ending = (name: string): string => /\.([^.\\/]+)$/.exec(name)?.[1]?.toLowerCase() ?? "";

const SAVE_AS = "Save the table as CSV or as a workbook (.xlsx) and choose that file.";

/** A workbook of the kind before 2007, or one that is encrypted: both come in the same container. */
function compoundFile(name: string): RefusedFile {
  if (ending(name) === "xls") {
    return refuseFile(
      "old-workbook",
      "This is a workbook of the old kind (.xls), which cannot be read.",
      SAVE_AS,
    );
  }
  return refuseFile(
    "encrypted-workbook",
    "The workbook is protected by a password, or is of the old kind (.xls).",
    "Take the password off, or save the workbook again as .xlsx.",
  );
}

export function macroWorkbook(): RefusedFile {
  return refuseFile(
    "macro-workbook",
    "The workbook holds macros, which are not let in.",
    "Save it as a workbook without macros (.xlsx), or as CSV.",
  );
}

/**
 * Is this a text file or a workbook? The first bytes decide, and the name must agree with them.
 * @throws RefusedFile for every other kind
 */
export function fileKind(name: string, head: Buffer): FileKind {
  const end = ending(name);
  if (MACRO_NAMES.includes(end)) throw macroWorkbook();
  if (begins(head, "d0cf11e0a1b11ae1")) throw compoundFile(name);
  const other = OTHER_KINDS.find(({ magic }) => begins(head, magic));
  if (other) throw refuseFile("wrong-type", `“${name}” is ${other.name}, not a table of readings.`, SAVE_AS);
  const isZip = begins(head, "504b0304") || begins(head, "504b0506");
  if (isZip && end === "xlsx") return "xlsx";
  if (isZip && TEXT_NAMES.includes(end)) {
    throw refuseFile(
      "wrong-type",
      `“${name}” is named as a text file but its content is a workbook or an archive.`,
      "If it is a workbook, name it .xlsx; if it is an archive, unpack it first.",
    );
  }
  if (!isZip && TEXT_NAMES.includes(end)) return "csv";
  if (!isZip && end === "xlsx") {
    throw refuseFile("wrong-type", `“${name}” is named as a workbook but its content is not one.`, SAVE_AS);
  }
  const shown = end === "" ? "files without an ending" : `files ending in .${end}`;
  throw refuseFile("wrong-type", `“${name}” cannot be read: ${shown} are not taken.`, SAVE_AS);
}
