import {
  CellApiModule,
  CellStyleModule,
  ClientSideRowModelModule,
  ColumnApiModule,
  CustomEditorModule,
  createGrid,
  type GridApi,
  type GridOptions,
  ModuleRegistry,
  RenderApiModule,
  RowApiModule,
  ScrollApiModule,
  type SuppressKeyboardEventParams,
} from "ag-grid-community";
import { cellSignature } from "./grid-cell";
import { columnId, columnsOf, keyOf, THEME } from "./grid-columns";
import type { GridDesk, Outcome } from "./grid-desk";
import type { EditorContext } from "./grid-editor";
import { type GridAct, type GridMove, moveFor } from "./grid-keys";
import { cellBelow, cellBeside, type SheetRow } from "./grid-model";
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

const ROW_PX = 50;
const HEAD_PX = 66;
/** Room for the bar along the bottom and the frame. */
const SCROLLBAR_PX = 20;
/** So many columns are all in the document, so that a screen reader finds them. */
const MOST_COLUMNS_DRAWN = 24;

/** The sheet on the page: painting, typing, walking about and pasting. Everything that it decides is asked of the desk. */
export function showGrid(element: HTMLElement, options: GridTableOptions): GridTable {
  const board = new GridBoard(element, options);
  return { focus: (row, column) => board.focus(row, column), destroy: () => board.destroy() };
}

class GridBoard {
  readonly #element: HTMLElement;
  readonly #options: GridTableOptions;
  readonly #desk: GridDesk;
  readonly #context: EditorContext;
  readonly #api: GridApi<SheetRow>;
  readonly #painted = new Map<string, string>();
  readonly #stopListening: () => void;

  constructor(element: HTMLElement, options: GridTableOptions) {
    this.#element = element;
    this.#options = options;
    this.#desk = options.desk;
    this.#context = { desk: options.desk, pending: null };
    const heightPx = HEAD_PX + options.desk.sheet.rows.length * ROW_PX + SCROLLBAR_PX;
    element.style.height = `min(${heightPx}px, max(74vh, 24rem))`;
    this.#api = createGrid<SheetRow>(element, this.#gridOptions());
    element.addEventListener("paste", this.#onPaste);
    element.addEventListener("copy", this.#onCopy);
    this.#stopListening = this.#desk.subscribe(this.#paintChanges);
    this.#paintChanges();
  }

  #gridOptions(): GridOptions<SheetRow> {
    const { nonce, onFocus } = this.#options;
    const { rows, columns } = this.#desk.sheet;
    return {
      theme: THEME,
      ...(nonce === undefined ? {} : { styleNonce: nonce }),
      context: this.#context,
      rowData: [...rows],
      getRowId: ({ data }) => String(data.pointId),
      columnDefs: columnsOf(this.#desk),
      defaultColDef: { resizable: true, suppressKeyboardEvent: this.#onKey },
      rowHeight: ROW_PX,
      headerHeight: HEAD_PX,
      stopEditingWhenCellsLoseFocus: true,
      suppressScrollOnNewData: true,
      suppressColumnVirtualisation: columns.length <= MOST_COLUMNS_DRAWN,
      onCellFocused: ({ rowIndex, column }) => {
        const at = typeof column === "object" && column !== null ? this.#columnAt(column) : -1;
        onFocus(rowIndex === null || at < 0 ? null : { row: rowIndex, column: at });
      },
    };
  }

  #columnAt(column: { getColId(): string }): number {
    return this.#desk.sheet.columns.findIndex((each) => columnId(each) === column.getColId());
  }

  /** Where the cursor stands; null where it is on no parameter's cell. */
  #here(): { row: number; column: number } | null {
    const at = this.#api.getFocusedCell();
    const column = at ? this.#columnAt(at.column) : -1;
    return at && column >= 0 ? { row: at.rowIndex, column } : null;
  }

  focus(row: number, column: number): void {
    const at = this.#desk.sheet.columns[column];
    if (!at) return;
    this.#api.ensureIndexVisible(row);
    this.#api.ensureColumnVisible(columnId(at));
    this.#api.setFocusedCell(row, columnId(at));
  }

  /** Hands over what is typed in the open cell; answers what became of it. */
  #takePending(): Outcome {
    const { pending } = this.#context;
    this.#context.pending = null;
    return pending ? this.#desk.type(pending.key, pending.text) : "nothing";
  }

  #go(move: GridMove, row: number, column: number): boolean {
    const { sheet } = this.#desk;
    const next =
      move === "down" || move === "up"
        ? cellBelow(sheet, row, column, move === "down" ? 1 : -1)
        : cellBeside(sheet, row, column, move === "right" ? 1 : -1);
    if (next) this.focus(...next);
    return next !== null;
  }

  /** Answers whether the grid shall leave the key alone. */
  #onKey = (params: SuppressKeyboardEventParams<SheetRow>): boolean => {
    const { event, editing } = params;
    const row = params.node.rowIndex ?? 0;
    const column = this.#columnAt(params.column);
    const key = this.#desk.keyAt(row, column);
    if (key === null || event.isComposing) return false;
    const act = moveFor(event, editing, this.#context.pending?.typedOver ?? false);
    if (act === null) return editing;
    if (act === "native") return false;
    if (act === "cancel") {
      this.#context.pending = null;
      return false;
    }
    const isOurs = editing ? this.#leaveCell(act, row, column) : this.#carryOut(act, key, row, column);
    if (isOurs) event.preventDefault();
    return isOurs;
  };

  /** Enter, Tab or an arrow while typing. A value that waits keeps the cursor after Enter: the second Enter confirms it. */
  #leaveCell(act: GridAct, row: number, column: number): boolean {
    const outcome = this.#takePending();
    this.#api.stopEditing(true);
    const stays = act.because === "enter" && outcome === "waits";
    if (stays || !this.#go(act.move, row, column)) this.focus(row, column);
    return true;
  }

  #carryOut(act: GridAct, key: string, row: number, column: number): boolean {
    switch (act.because) {
      case "enter":
        this.#desk.confirm(key);
        this.#go(act.move, row, column);
        return true;
      case "tab":
        return this.#go(act.move, row, column);
      case "clear":
        this.#desk.clear(key);
        return true;
      case "undo":
        this.#desk.undo();
        return true;
      case "redo":
        this.#desk.redo();
        return true;
      case "send-block":
        this.#options.say(sentText(this.#desk.sendBlock()));
        return true;
      case "leave":
        this.#options.onLeave();
        return true;
      case "arrow":
        return false;
    }
  }

  #onPaste = (event: ClipboardEvent): void => {
    const { say } = this.#options;
    const text = event.clipboardData?.getData("text/plain") ?? "";
    const isBlock = /[\t\n\r]/.test(text.replace(/[\r\n]+$/, ""));
    if (this.#context.pending && !isBlock) return;
    const at = this.#here();
    event.preventDefault();
    this.#context.pending = null;
    this.#api.stopEditing(true);
    const block = parseBlock(text);
    if (!at) return say("Put the cursor on the cell where the block begins, then paste again.");
    if (block === null)
      return say(
        "This is more than a sheet of readings can hold (5,000 cells). Bring it in as a file instead.",
      );
    const { placed, lost } = this.#desk.paste(at, block);
    say(pastedText(placed, lost));
    this.focus(at.row, at.column);
  };

  #onCopy = (event: ClipboardEvent): void => {
    const at = this.#here();
    const key = at && this.#desk.keyAt(at.row, at.column);
    if (!key || this.#context.pending) return;
    event.clipboardData?.setData("text/plain", this.#desk.view(key).text);
    event.preventDefault();
  };

  /** Paints the cells that look different from before, in the same breath as the change. */
  #paintChanges = (): void => {
    for (const row of this.#desk.sheet.rows) {
      const changed = this.#desk.sheet.columns.filter((column) => this.#hasChanged(keyOf(row, column)));
      const node = changed.length > 0 ? this.#api.getRowNode(String(row.pointId)) : undefined;
      if (!node) continue;
      this.#api.refreshCells({
        rowNodes: [node],
        columns: changed.map(columnId),
        force: true,
        suppressFlash: true,
      });
    }
  };

  #hasChanged(key: string): boolean {
    const signature = cellSignature(this.#desk.view(key));
    if (this.#painted.get(key) === signature) return false;
    this.#painted.set(key, signature);
    return true;
  }

  destroy(): void {
    this.#stopListening();
    this.#element.removeEventListener("paste", this.#onPaste);
    this.#element.removeEventListener("copy", this.#onCopy);
    this.#api.destroy();
  }
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
