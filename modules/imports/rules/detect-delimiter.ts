import type { FileDelimiter } from "@/modules/imports/model";
import { RefusedFile } from "@/modules/imports/rules/refused-file";
import { RecordSplitter, type TextRecord } from "@/modules/imports/rules/split-records";

/** In this order when nothing else decides. */
export const DELIMITERS: readonly FileDelimiter[] = [",", ";", "\t", "|"];

/** Spreadsheets write the delimiter they mean on a first line of its own: `sep=;`. */
const SEPARATOR_LINE = /^sep=([,;\t|])(?:\r\n|\n|\r)/i;

export type DelimiterGuess = {
  delimiter: FileDelimiter;
  /** True when the first line is `sep=…` and no record. */
  hasSeparatorLine: boolean;
};

function recordsOf(sample: string, delimiter: FileDelimiter, isWholeFile: boolean): TextRecord[] {
  const splitter = new RecordSplitter(delimiter);
  try {
    const records = splitter.push(sample);
    const last = isWholeFile || records.length === 0 ? splitter.end() : null;
    return last ? [...records, last] : records;
  } catch (refused) {
    if (refused instanceof RefusedFile) return [];
    throw refused;
  }
}

/** How many of the records have the most frequent number of fields above one, and how many fields that is. */
function agreement(records: TextRecord[]): { share: number; fields: number } {
  const counts = new Map<number, number>();
  const filled = records.filter((record) => record.fields > 0).slice(0, 100);
  for (const { fields } of filled) counts.set(fields, (counts.get(fields) ?? 0) + 1);
  let best = { share: 0, fields: 1 };
  for (const [fields, count] of counts) {
    const share = count / filled.length;
    if (fields > 1 && (share > best.share || (share === best.share && fields > best.fields)))
      best = { share, fields };
  }
  return best;
}

/**
 * Which sign parts the fields of a text file? The one that gives the most records the same number of fields,
 * quotes respected; among equals the one with more fields. A file of one column counts as comma-separated.
 * @param sample the file's beginning, decoded, without a byte order mark
 */
export function detectDelimiter(sample: string, isWholeFile = true): DelimiterGuess {
  const declared = SEPARATOR_LINE.exec(sample)?.[1];
  if (declared) return { delimiter: declared as FileDelimiter, hasSeparatorLine: true };
  let best: { delimiter: FileDelimiter; share: number; fields: number } = {
    delimiter: ",",
    share: 0,
    fields: 1,
  };
  for (const delimiter of DELIMITERS) {
    const { share, fields } = agreement(recordsOf(sample, delimiter, isWholeFile));
    const isBetter =
      share > best.share + 1e-9 || (Math.abs(share - best.share) <= 1e-9 && fields > best.fields);
    if (isBetter) best = { delimiter, share, fields };
  }
  return { delimiter: best.delimiter, hasSeparatorLine: false };
}
