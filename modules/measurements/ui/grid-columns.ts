import { type ColDef, themeQuartz } from "ag-grid-community";
import { unitLabel } from "@/lib/units/factors";
import { paintCell } from "./grid-cell";
import type { GridDesk } from "./grid-desk";
import { GridEditor } from "./grid-editor";
import { cellKey, type SheetColumn, type SheetRow } from "./grid-model";

/** Our stone, water and ink; the variables follow the theme of the page. */
export const THEME = themeQuartz.withParams({
  backgroundColor: "var(--sheet)",
  foregroundColor: "var(--ink)",
  textColor: "var(--ink)",
  accentColor: "var(--water)",
  borderColor: "var(--rule)",
  chromeBackgroundColor: "var(--sheet)",
  headerBackgroundColor: "var(--sheet)",
  headerTextColor: "var(--ink-2)",
  headerFontWeight: 600,
  fontFamily: "var(--font-sans)",
  headerFontFamily: "var(--font-sans)",
  fontSize: 15,
  rowHoverColor: "transparent",
  oddRowBackgroundColor: "transparent",
  columnBorder: { color: "var(--rule)" },
  wrapperBorder: { color: "var(--edge)" },
  wrapperBorderRadius: 3,
  cellHorizontalPadding: 8,
  spacing: 6,
});

/** Keeps a unit such as mg/L O2 together in the head. */
const NO_BREAK_SPACE = "\u00a0";

export const keyOf = (row: SheetRow, column: SheetColumn) => cellKey(row.pointId, column.parameterId);
export const columnId = (column: SheetColumn) => `p${column.parameterId}`;

/** The columns of the sheet: the system that names its row, then what is read. */
export function columnsOf(desk: GridDesk): ColDef<SheetRow>[] {
  const system: ColDef<SheetRow> = {
    colId: "system",
    headerName: "System",
    pinned: "left",
    width: 176,
    suppressMovable: true,
    suppressNavigable: true,
    cellStyle: {
      display: "flex",
      alignItems: "center",
      fontWeight: 600,
      lineHeight: 1.2,
      whiteSpace: "normal",
    },
    valueGetter: ({ data }) =>
      data ? `${data.systemCode}${data.isDefaultPoint ? "" : ` ${data.pointName.toLowerCase()}`}` : "",
  };
  const parameters = desk.sheet.columns.map((column): ColDef<SheetRow> => {
    const unit = unitLabel(column.unit);
    return {
      colId: columnId(column),
      headerName: unit === "" ? column.name : `${column.name}, ${unit.replaceAll(" ", NO_BREAK_SPACE)}`,
      headerClass: "ag-right-aligned-header",
      wrapHeaderText: true,
      autoHeaderHeight: true,
      minWidth: 140,
      flex: 1,
      suppressMovable: true,
      sortable: false,
      valueGetter: ({ data }) => (data ? desk.view(keyOf(data, column)).text : ""),
      cellRenderer: ({ data }: { data?: SheetRow }) =>
        data ? paintCell(desk, desk.view(keyOf(data, column)), column.unit) : document.createElement("div"),
      editable: ({ data }) => data !== undefined && desk.view(keyOf(data, column)).isOpen,
      cellEditor: GridEditor,
      cellEditorParams: { keyOf: ({ data }: { data: SheetRow }) => keyOf(data, column) },
    };
  });
  return [system, ...parameters];
}
