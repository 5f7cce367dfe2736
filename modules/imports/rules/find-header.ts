import {
  type ColumnMap,
  type ColumnUse,
  type FileRefusal,
  IMPORT_LIMITS,
  type ImportField,
  type KnownParameter,
  type MappedColumn,
  type RawCell,
  type RawRow,
} from "@/modules/imports/model";
import { HEADER_WORDS } from "@/modules/imports/rules/header-words.data";

export type HeaderFound = { kind: "found"; columnMap: ColumnMap; rowIndex: number };
export type HeaderResult = HeaderFound | { kind: "refused"; refusal: FileRefusal };

/** Without case, accents, spaces and signs, so that "Taken-by", "TAKEN BY" and "taken_by" are one. */
export function headerKey(text: string): string {
  return text
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .replace(/[^\p{L}\p{N}%]+/gu, "");
}

const FIELD_BY_KEY: ReadonlyMap<string, ImportField> = new Map(
  (Object.keys(HEADER_WORDS) as ImportField[]).flatMap((field) =>
    HEADER_WORDS[field].map((word): [string, ImportField] => [headerKey(word), field]),
  ),
);

/** A column's letter as spreadsheets show it: 0 is A, 26 is AA. */
export function columnLetter(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : columnLetter(Math.floor(index / 26) - 1) + last;
}

/** The header's text as one line; what is no text (a number, a date) is no header. */
function headerText(cell: RawCell | undefined): string {
  const plain = cell !== null && typeof cell === "object" && cell.kind === "formula" ? cell.value : cell;
  return typeof plain === "string" ? plain.replace(/\s+/g, " ").trim() : "";
}

const WITH_UNIT = /^(.+?)\s*[([]\s*([^()[\]]+?)\s*[)\]]$/;

/** "Temperature (°C)" → name and unit; a header without brackets has no unit. */
export function splitUnit(header: string): { name: string; unit: string | null } {
  const found = WITH_UNIT.exec(header);
  return found?.[1] && found[2] ? { name: found[1], unit: found[2] } : { name: header, unit: null };
}

/** Finds the parameter a header names, by code or by one of its names. */
export function parameterIndex(parameters: readonly KnownParameter[]): ReadonlyMap<string, string> {
  const index = new Map<string, string>();
  for (const { code, names } of parameters) {
    for (const name of [code, ...names]) {
      if (headerKey(name) !== "" && !index.has(headerKey(name))) index.set(headerKey(name), code);
    }
  }
  return index;
}

function useOf(header: string, parameters: ReadonlyMap<string, string>): ColumnUse {
  const whole = parameters.get(headerKey(header));
  const { name, unit } = splitUnit(header);
  const field = FIELD_BY_KEY.get(headerKey(header)) ?? (unit ? FIELD_BY_KEY.get(headerKey(name)) : undefined);
  if (field) return { kind: "field", field };
  if (whole) return { kind: "parameter", parameter: whole, unit: null };
  const named = parameters.get(headerKey(name));
  if (named) return { kind: "parameter", parameter: named, unit };
  return unit ? { kind: "parameter", parameter: name, unit } : { kind: "unknown" };
}

const isField = (column: MappedColumn, field: ImportField) =>
  column.use.kind === "field" && column.use.field === field;
const has = (columns: MappedColumn[], field: ImportField) => columns.some((column) => isField(column, field));

function mapColumns(row: RawRow, parameters: ReadonlyMap<string, string>): MappedColumn[] {
  return row.cells.map((cell, index) => {
    const header = headerText(cell);
    return { index, header, use: header === "" ? { kind: "unknown" } : useOf(header, parameters) };
  });
}

/** How much of a row reads like a header; 0 when it cannot be one. */
function score(columns: MappedColumn[]): number {
  const known = columns.filter((column) => column.use.kind !== "unknown").length;
  const isLong = has(columns, "parameter") && has(columns, "value");
  const hasParameters = columns.some((column) => column.use.kind === "parameter");
  const hasWhen = has(columns, "moment") || has(columns, "date") || has(columns, "time");
  return isLong || (hasParameters && (hasWhen || known > 1)) ? known : 0;
}

function refuse(code: FileRefusal["code"], reason: string, mend: string, line: number): HeaderResult {
  return { kind: "refused", refusal: { code, reason, mend, line } };
}

/** Columns that say the same, by `keyOf`; the first such group. */
function doubled(columns: MappedColumn[], keyOf: (column: MappedColumn) => string | null): MappedColumn[] {
  const groups = new Map<string, MappedColumn[]>();
  for (const column of columns) {
    const key = keyOf(column);
    if (key !== null) groups.set(key, [...(groups.get(key) ?? []), column]);
  }
  return [...groups.values()].find((group) => group.length > 1) ?? [];
}

const places = (columns: MappedColumn[]): string =>
  columns.map((column) => columnLetter(column.index)).join(" and ");

function duplicateRefusal(columns: MappedColumn[], line: number): HeaderResult | null {
  const mend = "Rename or remove one of the columns.";
  const same = doubled(columns, ({ header }) => headerKey(header) || null);
  if (same[0]) {
    const reason = `The header “${same[0].header}” stands in columns ${places(same)}, so it is not clear which is meant.`;
    return refuse("duplicate-headers", reason, mend, line);
  }
  const twins = doubled(columns, meaningOf);
  if (twins.length === 0) return null;
  const names = twins.map((column) => `“${column.header}”`).join(" and ");
  const reason = `The headers ${names} (columns ${places(twins)}) mean the same, so it is not clear which is meant.`;
  return refuse("duplicate-headers", reason, mend, line);
}

function meaningOf({ use }: MappedColumn): string | null {
  if (use.kind === "field") return use.field;
  return use.kind === "parameter" ? `parameter ${headerKey(use.parameter)}` : null;
}

/** A column “Time” without any date column holds the whole moment. */
function timeAsMoment(columns: MappedColumn[]): MappedColumn[] {
  if (has(columns, "moment") || has(columns, "date")) return columns;
  const moment: ColumnUse = { kind: "field", field: "moment" };
  return columns.map((column) => (isField(column, "time") ? { ...column, use: moment } : column));
}

/** A long file reads parameter columns as unknown; a wide file reads a parameter or value column so. */
function inForm(columns: MappedColumn[]): { form: ColumnMap["form"]; columns: MappedColumn[] } {
  const form = has(columns, "parameter") && has(columns, "value") ? "long" : "wide";
  const drop = (use: ColumnUse): boolean =>
    form === "long"
      ? use.kind === "parameter"
      : use.kind === "field" && ["parameter", "value", "unit"].includes(use.field);
  const unknown: ColumnUse = { kind: "unknown" };
  return {
    form,
    columns: columns.map((column) => (drop(column.use) ? { ...column, use: unknown } : column)),
  };
}

/**
 * Which of the first rows is the header, and what does each column mean?
 * Long form has a column for the parameter and one for the value; wide form has columns named for parameters,
 * known ones by code or name, others by a unit in brackets: "Redox (mV)".
 */
export function findHeader(rows: readonly RawRow[], known: readonly KnownParameter[]): HeaderResult {
  const parameters = parameterIndex(known);
  let best: { columns: MappedColumn[]; score: number; rowIndex: number; line: number } | null = null;
  for (const [rowIndex, row] of rows.slice(0, IMPORT_LIMITS.headerRows).entries()) {
    const columns = mapColumns(row, parameters);
    const found = score(columns);
    if (found > (best?.score ?? 0)) best = { columns, score: found, rowIndex, line: row.line };
  }
  if (!best) return noHeader(rows[0]?.line ?? 1);
  const twins = duplicateRefusal(best.columns, best.line);
  if (twins) return twins;
  const { form, columns } = inForm(timeAsMoment(best.columns));
  if (!has(columns, "moment") && !has(columns, "date")) {
    return refuse(
      "no-header",
      `The header on line ${best.line} has no column for the date and time of the readings.`,
      "Add a column “Taken at”, or a column “Date” and a column “Time”.",
      best.line,
    );
  }
  return { kind: "found", columnMap: { form, headerLine: best.line, columns }, rowIndex: best.rowIndex };
}

function noHeader(line: number): HeaderResult {
  return refuse(
    "no-header",
    `None of the first ${IMPORT_LIMITS.headerRows} lines reads like a header.`,
    "Name the columns System, Parameter, Value, Unit and Taken at, or give each parameter a column of its own, such as “Temperature (°C)”.",
    line,
  );
}
