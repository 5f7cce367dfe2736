import Papa from "papaparse";

/** A block of cells as a spreadsheet puts it on the clipboard: rows of texts. */
export type Block = readonly (readonly string[])[];

const MOST_CELLS = 5_000;

/**
 * Which cells does a text from the clipboard hold? Tabs between cells, line ends between rows, quotes around a cell that
 * holds either; empty cells and empty rows keep their place. Null when it is larger than a sheet of readings can be.
 * @example parseBlock("13.4\t34,6\r\n\t33.9\r\n") // [["13.4", "34,6"], ["", "33.9"]]
 */
export function parseBlock(text: string): Block | null {
  const body = text.replace(/\r\n?/g, "\n").replace(/\n$/, "");
  if (body === "") return [];
  const { data } = Papa.parse<string[]>(body, { delimiter: "\t", newline: "\n", skipEmptyLines: false });
  const cells = data.reduce((sum, row) => sum + row.length, 0);
  return cells > MOST_CELLS ? null : data.map((row) => row.map((cell) => cell.trim()));
}
