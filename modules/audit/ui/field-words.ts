/** A row as the history keeps it; null where there was none. */
export type Row = Readonly<Record<string, unknown>>;

/** One field of a change, in words. */
export type FieldChange = { name: string; word: string; before: unknown; after: unknown; differs: boolean };

const TAILS = /_(id|at|on|by)$/;
const UNITS: Readonly<Record<string, string>> = { _l: "L", _m: "m", _c: "°C", _ms: "ms" };

/** A table's name for a person: "measurements_limit_version" is a "limit version". */
export function tableWord(table: string): string {
  const [, ...rest] = table.split("_");
  return rest.length > 0 ? rest.join(" ") : table;
}

/** A column's name for a person: "taken_at" is "taken at", "point_id" is "point", "volume_l" is "volume (L)". */
export function fieldWord(name: string): string {
  const unit = Object.entries(UNITS).find(([tail]) => name.endsWith(tail));
  if (unit) return `${name.slice(0, -unit[0].length).replaceAll("_", " ")} (${unit[1]})`;
  const stem = name.endsWith("_id") ? name.slice(0, -3) : name;
  return stem.replaceAll("_", " ");
}

/** What a value is, as far as its column's name tells. */
export type ValueKind = "nothing" | "moment" | "day" | "person" | "reference" | "yes-no" | "data" | "plain";

const PEOPLE = /^(person|actor|owner|deputy)_id$/;
const YES_NO = /^(is|has|may|was)_/;

/** How is a value to be shown? Moments in the facility's zone, people by name, JSON laid out. */
export function valueKind(name: string, value: unknown): ValueKind {
  if (value === null || value === undefined) return "nothing";
  if (typeof value === "number" && name.endsWith("_at")) return "moment";
  if (typeof value === "number" && (name.endsWith("_by") || PEOPLE.test(name))) return "person";
  if (typeof value === "number" && YES_NO.test(name)) return "yes-no";
  if (typeof value === "string" && /^\d{4}-\d{2}-\d{2}$/.test(value) && name.endsWith("_on")) return "day";
  if (typeof value === "object" || isJson(value)) return "data";
  return TAILS.test(name) && name.endsWith("_id") ? "reference" : "plain";
}

function isJson(value: unknown): boolean {
  if (typeof value !== "string" || !/^[[{]/.test(value)) return false;
  try {
    JSON.parse(value);
    return true;
  } catch {
    return false;
  }
}

/** JSON laid out over lines, whether it comes as text or as a value. */
export function prettyJson(value: unknown): string {
  const parsed: unknown = typeof value === "string" ? JSON.parse(value) : value;
  return JSON.stringify(parsed, null, 2);
}

/** A row's JSON as fields; null where there is no row, or where it cannot be read any more. */
export function readRow(json: string | null): Row | null {
  if (json === null) return null;
  try {
    return JSON.parse(json) as Row;
  } catch {
    return null;
  }
}

const same = (a: unknown, b: unknown): boolean => a === b || JSON.stringify(a) === JSON.stringify(b);

/** A change field by field; a row that came or went differs in every field that holds something. */
export function fieldChanges(before: Row | null, after: Row | null): FieldChange[] {
  const names = [...new Set([...Object.keys(after ?? {}), ...Object.keys(before ?? {})])];
  return names.map((name) => {
    const [was, is] = [before?.[name] ?? null, after?.[name] ?? null];
    return { name, word: fieldWord(name), before: was, after: is, differs: !same(was, is) };
  });
}
