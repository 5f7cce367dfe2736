import {
  CellApiModule,
  CellStyleModule,
  ClientSideRowModelModule,
  type ColDef,
  ColumnApiModule,
  CustomEditorModule,
  createGrid,
  type GridApi,
  ModuleRegistry,
  RenderApiModule,
  RowApiModule,
  ScrollApiModule,
  type SuppressKeyboardEventParams,
  themeQuartz,
} from "ag-grid-community";
import { unitLabel } from "@/lib/units/factors";
import { cellSignature, paintCell } from "./grid-cell";
import type { GridDesk } from "./grid-desk";
import { type EditorContext, GridEditor } from "./grid-editor";
import { type GridMove, moveFor } from "./grid-keys";
import { cellBelow, cellBeside, cellKey, type SheetColumn, type SheetRow } from "./grid-model";
import { parseBlock } from "./parse-block";

ModuleRegistry.registerModules([
  ClientSideRowModelModule,
  CustomEditorModule,
  CellStyleModule,
  CellApiModule,
  ColumnApiModule,
  RenderApiModule,
  RowApiModule,
  ScrollApiModule,
]);

/** Our stone, water and ink; the variables follow the theme of the page. */
const THEME = themeQuartz.withParams({
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

export interface GridTableOptions {
  readonly desk: GridDesk;
  readonly nonce: string | undefined;
  /** Which cell the cursor stands on, or null. */
  readonly onFocus: (at: { row: number; column: number } | null) => void;
  readonly say: (text: string) => void;
  /** Escape: out of the sheet. */
  readonly onLeave: () => void;
}

export interface GridTable {
  /** Puts the cursor on a cell. */
  focus: (row: number, column: number) => void;
  destroy: () => void;
}

const columnId = (column: SheetColumn) => `p${column.parameterId}`;

function columnsOf(
  desk: GridDesk,
  keyOf: (row: SheetRow, column: SheetColumn) => string,
): ColDef<SheetRow>[] {
  const system: ColDef<SheetRow> = {
    colId: "system",
    headerName: "System",
    pinned: "left",
    width: 148,
    suppressMovable: true,
    suppressNavigable: true,
    cellClass: "desk-head",
    valueGetter: ({ data }) =>
      data ? `${data.systemCode}${data.isDefaultPoint ? "" : ` ${data.pointName.toLowerCase()}`}` : "",
  };
  const parameters = desk.sheet.columns.map((column): ColDef<SheetRow> => {
    const unit = unitLabel(column.unit);
    return {
      colId: columnId(column),
      headerName: unit === "" ? column.name : `${column.name}, ${unit}`,
      wrapHeaderText: true,
      minWidth: 124,
      width: 132,
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

/** The sheet on the page: painting, typing, walking about and pasting. Everything that it decides is asked of the desk. */
export function showGrid(element: HTMLElement, options: GridTableOptions): GridTable {
  const { desk, nonce, onFocus, say } = options;
  const { rows, columns } = desk.sheet;
  const context: EditorContext = { desk, pending: null };
  const keyOf = (row: SheetRow, column: SheetColumn) => cellKey(row.pointId, column.parameterId);

  const api: GridApi<SheetRow> = createGrid<SheetRow>(element, {
    theme: THEME,
    ...(nonce === undefined ? {} : { styleNonce: nonce }),
    context,
    rowData: [...rows],
    getRowId: ({ data }) => String(data.pointId),
    columnDefs: columnsOf(desk, keyOf),
    defaultColDef: { resizable: true, suppressKeyboardEvent: (params) => onKey(params) },
    rowHeight: 50,
    headerHeight: 52,
    domLayout: rows.length > 14 ? "normal" : "autoHeight",
    stopEditingWhenCellsLoseFocus: true,
    suppressScrollOnNewData: true,
    suppressColumnVirtualisation: columns.length <= 24,
    onCellEditingStopped: () => takePending(),
    onCellFocused: ({ rowIndex, column }) => {
      const at =
        typeof column === "object" && column !== null
          ? columns.findIndex((each) => columnId(each) === column.getColId())
          : -1;
      onFocus(rowIndex === null || at < 0 ? null : { row: rowIndex, column: at });
    },
  });

  const focus = (row: number, column: number) => {
    const at = columns[column];
    if (!at) return;
    api.ensureIndexVisible(row);
    api.ensureColumnVisible(columnId(at));
    api.setFocusedCell(row, columnId(at));
  };

  /** Hands over what is typed in the open cell; answers what became of it. */
  function takePending() {
    const { pending } = context;
    context.pending = null;
    return pending ? desk.type(pending.key, pending.text) : "nothing";
  }

  function go(move: GridMove, row: number, column: number): boolean {
    const next =
      move === "down" || move === "up"
        ? cellBelow(desk.sheet, row, column, move === "down" ? 1 : -1)
        : cellBeside(desk.sheet, row, column, move === "right" ? 1 : -1);
    if (next) focus(...next);
    return next !== null;
  }

  function onKey(params: SuppressKeyboardEventParams<SheetRow>): boolean {
    const { event, editing } = params;
    const row = params.node.rowIndex ?? 0;
    const column = columns.findIndex((each) => columnId(each) === params.column.getColId());
    const key = desk.keyAt(row, column);
    if (key === null || event.isComposing) return false;
    const act = moveFor(event, editing, context.pending?.typedOver ?? false);
    if (act === null) return editing;
    if (act === "native") return false;
    const handled = () => {
      event.preventDefault();
      return true;
    };
    if (act === "cancel") {
      context.pending = null;
      return false;
    }
    if (editing) {
      const outcome = takePending();
      api.stopEditing(true);
      const stays = act.because === "enter" && outcome === "waits";
      if (stays || !go(act.move, row, column)) focus(row, column);
      return handled();
    }
    switch (act.because) {
      case "enter":
        desk.confirm(key);
        go(act.move, row, column);
        return handled();
      case "tab":
        return go(act.move, row, column) ? handled() : false;
      case "clear":
        desk.clear(key);
        return handled();
      case "undo":
        desk.undo();
        return handled();
      case "redo":
        desk.redo();
        return handled();
      case "send-block":
        say(sentText(desk.sendBlock()));
        return handled();
      case "leave":
        options.onLeave();
        return handled();
      case "arrow":
        return false;
    }
  }

  const onPaste = (event: ClipboardEvent) => {
    const text = event.clipboardData?.getData("text/plain") ?? "";
    const at = api.getFocusedCell();
    const isBlock = /[\t\n\r]/.test(text.replace(/[\r\n]+$/, ""));
    if (!at || (context.pending && !isBlock)) return;
    event.preventDefault();
    context.pending = null;
    api.stopEditing(true);
    const column = columns.findIndex((each) => columnId(each) === at.column.getColId());
    const block = parseBlock(text);
    if (column < 0) return say("Put the cursor on the cell where the block begins, then paste again.");
    if (block === null)
      return say(
        "This is more than a sheet of readings can hold (5,000 cells). Bring it in as a file instead.",
      );
    const { placed, lost } = desk.paste({ row: at.rowIndex, column }, block);
    say(pastedText(placed, lost));
    focus(at.rowIndex, column);
  };
  const onCopy = (event: ClipboardEvent) => {
    const at = api.getFocusedCell();
    if (!at || context.pending) return;
    const key = desk.keyAt(
      at.rowIndex,
      columns.findIndex((each) => columnId(each) === at.column.getColId()),
    );
    if (key === null) return;
    event.clipboardData?.setData("text/plain", desk.view(key).text);
    event.preventDefault();
  };
  element.addEventListener("paste", onPaste);
  element.addEventListener("copy", onCopy);

  const painted = new Map<string, string>();
  const paintChanges = () => {
    for (const row of rows) {
      const changed = columns.filter((column) => {
        const signature = cellSignature(desk.view(keyOf(row, column)));
        const isNew = painted.get(keyOf(row, column)) !== signature;
        if (isNew) painted.set(keyOf(row, column), signature);
        return isNew;
      });
      const node = changed.length > 0 ? api.getRowNode(String(row.pointId)) : undefined;
      if (node)
        api.refreshCells({
          rowNodes: [node],
          columns: changed.map(columnId),
          force: true,
          suppressFlash: true,
        });
    }
  };
  const unsubscribe = desk.subscribe(paintChanges);
  paintChanges();

  return {
    focus,
    destroy: () => {
      unsubscribe();
      element.removeEventListener("paste", onPaste);
      element.removeEventListener("copy", onCopy);
      api.destroy();
    },
  };
}

function sentText(count: number): string {
  return count === 0
    ? "Nothing was sent: no block was pasted, or some of it waits for you."
    : `${count} values handed over.`;
}

function pastedText(placed: number, lost: readonly string[]): string {
  const laid =
    placed === 0
      ? "Nothing was laid down."
      : `${placed} ${placed === 1 ? "value is" : "values are"} laid down and not sent yet.`;
  if (lost.length === 0) return laid;
  const rest = lost.length > 3 ? `, and ${lost.length - 3} more` : "";
  return `${laid} Left out: ${lost.slice(0, 3).join("; ")}${rest}.`;
}
