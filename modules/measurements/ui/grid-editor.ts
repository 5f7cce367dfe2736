import type { ICellEditorComp, ICellEditorParams } from "ag-grid-community";
import type { GridDesk } from "./grid-desk";

/** What is being typed in the one open cell; kept here until Enter, Tab, an arrow or a click takes it over. */
export interface PendingEdit {
  key: string;
  text: string;
  /** Began by typing over the cell: arrows leave it. Else (F2, double click) they move in the text. */
  typedOver: boolean;
}

export interface EditorContext {
  readonly desk: GridDesk;
  pending: PendingEdit | null;
}

export interface EditorParams {
  readonly keyOf: (params: { data: unknown }) => string;
}

/** The box of the cell that is being typed in: paints the status at every key. Plain DOM, no key is lost while it opens. */
export class GridEditor implements ICellEditorComp {
  #input!: HTMLInputElement;
  #context!: EditorContext;
  #own!: PendingEdit;

  init(params: ICellEditorParams & EditorParams): void {
    this.#context = params.context as EditorContext;
    const key = params.keyOf(params);
    const { desk } = this.#context;
    const begun = params.eventKey !== null && params.eventKey.length === 1 ? params.eventKey : null;
    const text = begun ?? desk.view(key).text;
    const watched = desk.sheet.watch.get(key);
    const isNumber = watched?.parameter.kind === "number" || watched?.parameter.kind === "count";
    const input = document.createElement("input");
    input.type = "text";
    input.className = "desk-input";
    input.inputMode = isNumber ? "decimal" : "text";
    input.autocomplete = "off";
    input.spellcheck = false;
    input.value = text;
    input.ariaLabel = `${watched?.systemCode ?? ""}, ${watched?.parameter.name ?? ""}`;
    input.addEventListener("input", () => this.#typed(key));
    this.#input = input;
    this.#own = { key, text, typedOver: begun !== null };
    this.#context.pending = this.#own;
    this.#typed(key);
  }

  #typed(key: string): void {
    const { desk } = this.#context;
    const text = this.#input.value;
    this.#own.text = text;
    const verdict = desk.judge(key, { text, unit: desk.unitAt(key) });
    this.#input.dataset.status = verdict?.state === "judged" ? verdict.verdict.status : "";
  }

  getGui(): HTMLElement {
    return this.#input;
  }

  afterGuiAttached(): void {
    this.#input.focus();
    const end = this.#input.value.length;
    this.#input.setSelectionRange(end, end);
  }

  /** The box closes. What nobody took over by a key (a click elsewhere) is handed over now; before the next key, after the grid has closed it. */
  destroy(): void {
    if (this.#context.pending !== this.#own) return;
    this.#context.pending = null;
    queueMicrotask(() => this.#context.desk.type(this.#own.key, this.#own.text));
  }

  getValue(): string {
    return this.#input.value;
  }
}
