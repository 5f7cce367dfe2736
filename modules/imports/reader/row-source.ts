import type { FileHeader, RawRow } from "@/modules/imports/model";

/** What a reader of one kind of file offers: facts about the file, and its rows in the order of the file. */
export type RowSource = {
  facts: Pick<FileHeader, "encoding" | "hasBom" | "delimiter" | "serialEpoch" | "sheet" | "sheets">;
  rows: AsyncGenerator<RawRow[]>;
  /** How much of the file has been read, 0 … 1. */
  share: () => number;
};
