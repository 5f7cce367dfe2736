import type {
  ColumnMap,
  ImportField,
  MappedColumn,
  PlainCell,
  RawCell,
  RawRow,
} from "@/modules/imports/model";

/** The cells that together say when. */
export type MomentCells = { moment?: RawCell; date?: RawCell; time?: RawCell };

/** Where each field stands, and which columns hold values; worked out once per file. */
export type RowLayout = {
  fields: ReadonlyMap<ImportField, MappedColumn>;
  /** The value column of the long form, or the parameter columns of the wide form. */
  values: readonly MappedColumn[];
  width: number;
};

export function layoutOf(map: ColumnMap): RowLayout {
  const fields = new Map<ImportField, MappedColumn>();
  for (const column of map.columns) {
    if (column.use.kind === "field") fields.set(column.use.field, column);
  }
  const value = fields.get("value");
  const values =
    map.form === "long"
      ? value
        ? [value]
        : []
      : map.columns.filter((column) => column.use.kind === "parameter");
  return { fields, values, width: map.columns.length };
}

/** The cell itself, or what a formula last came to. */
export function plainCell(cell: RawCell | undefined): Exclude<RawCell, { kind: "formula" }> {
  if (cell === undefined) return null;
  if (cell === null || typeof cell !== "object" || cell.kind !== "formula") return cell;
  if (cell.dateStyle === null || typeof cell.value !== "number") return cell.value;
  return { kind: "serial", value: cell.value, showsTime: cell.dateStyle === "time" };
}

function plainText(value: PlainCell): string {
  if (value === null) return "";
  if (typeof value === "boolean") return value ? "yes" : "no";
  return typeof value === "number" ? String(value) : value.trim();
}

/** What a cell says as text; a serial as its number, an error as its sign. */
export function cellText(cell: RawCell | undefined): string {
  const plain = plainCell(cell);
  if (plain === null || typeof plain !== "object") return plainText(plain);
  return plain.kind === "error" ? plain.text : String(plain.value);
}

export function fieldCell(row: RawRow, layout: RowLayout, field: ImportField): RawCell | undefined {
  const column = layout.fields.get(field);
  return column ? row.cells[column.index] : undefined;
}

export function momentCells(row: RawRow, layout: RowLayout): MomentCells {
  return {
    moment: fieldCell(row, layout, "moment"),
    date: fieldCell(row, layout, "date"),
    time: fieldCell(row, layout, "time"),
  };
}

/** Nothing but blanks: such a row is passed over. */
export function isBlankRow(row: RawRow): boolean {
  return (
    row.problem === undefined && row.cells.every((cell) => cellText(cell) === "" && !isEmptyFormula(cell))
  );
}

/** A formula that was saved without its result. */
export function isEmptyFormula(cell: RawCell | undefined): boolean {
  return cell !== null && typeof cell === "object" && cell.kind === "formula" && cell.value === null;
}
