import { inUnit } from "../rules/in-unit";
import {
  type CellKey,
  cellKey,
  completeAnswer,
  type Draft,
  EMPTY_GRID,
  type GridState,
  handOver,
  isReady,
  type Pasted,
  pasteBlock,
  putDraft,
  redo,
  type Sheet,
  undo,
  verdictAt,
} from "./grid-model";
import { type CellView, emptyView, itemView, type Need } from "./grid-view";
import { alsoRead, lastItem, type Taken, toParcel } from "./hand-over";
import { shortGround, type TypedVerdict } from "./judge-typed";
import type { Outbox } from "./outbox";

/** What became of a value when Enter or Tab was pressed. */
export type Outcome = "sent" | "waits" | "nothing";

const NO_TIME = "Set when the values were taken first; then press Enter here again.";

/** The desk: what stands on the sheet, what becomes of it, and who is told. No React in here, so that a key is painted at once. */
export class GridDesk {
  readonly sheet: Sheet;
  readonly #outbox: Outbox;
  readonly #now: () => number;
  readonly #newUuid: () => string;
  readonly #listeners = new Set<() => void>();
  #taken: Taken | null = { at: null, by: null };
  #state: GridState = EMPTY_GRID;
  #reopened = new Set<CellKey>();
  #version = 0;

  constructor(sheet: Sheet, outbox: Outbox, how: { now: () => number; newUuid: () => string }) {
    this.sheet = sheet;
    this.#outbox = outbox;
    this.#now = how.now;
    this.#newUuid = how.newUuid;
  }

  subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };
  /** Rises with every change. */
  version = (): number => this.#version;

  /** Something that the desk shows has changed elsewhere (the outbox). */
  touch = (): void => {
    this.#version += 1;
    for (const listener of this.#listeners) listener();
  };

  setTaken(taken: Taken | null): void {
    this.#taken = taken;
    this.touch();
  }

  keyAt(row: number, column: number): CellKey | null {
    const at = this.sheet.rows[row];
    const what = this.sheet.columns[column];
    return at && what ? cellKey(at.pointId, what.parameterId) : null;
  }

  view(key: CellKey): CellView {
    const watched = this.sheet.watch.get(key);
    const draft = this.#state.drafts.get(key);
    if (!watched) return emptyView(key, false, null);
    if (draft) return this.#draftView(key, draft);
    const item = this.#reopened.has(key) ? undefined : lastItem(this.#outbox.snapshot().items, key);
    if (item) return itemView(key, item);
    return emptyView(key, true, watched.unit);
  }

  #draftView(key: CellKey, draft: Draft): CellView {
    const verdict = this.judge(key, draft);
    const decimals = this.sheet.watch.get(key)?.parameter.decimals ?? 0;
    const judged = verdict?.state === "judged" ? verdict.verdict : null;
    const ready = isReady(draft, verdict);
    const wrong = verdict?.state === "wrong" ? verdict.sentence : null;
    const need: Need = wrong === null ? (ready ? "block" : "confirm") : "mend";
    return {
      key,
      isRead: true,
      isOpen: true,
      text: draft.text,
      unit: draft.unit,
      status: judged?.status ?? null,
      side: judged?.side ?? null,
      stage: "draft",
      need: draft.block === null && ready ? "mend" : need,
      ground: judged ? shortGround(judged, decimals) : "",
      sentence: wrong ?? (draft.block === null && ready ? NO_TIME : (judged?.sentence ?? "")),
      verdict,
      readingId: null,
    };
  }

  /** What the browser thinks of a text in a cell, also while it is still being typed. */
  judge(key: CellKey, draft: Pick<Draft, "text" | "unit">): TypedVerdict | null {
    const also = alsoRead(this.#outbox.snapshot().items, key);
    return verdictAt(this.sheet, key, draft, this.#taken?.at ?? this.#now(), also);
  }

  /** The unit in which a cell is typed: the header's, unless a draft says otherwise. */
  unitAt(key: CellKey): string | null {
    const draft = this.#state.drafts.get(key);
    if (draft) return draft.unit;
    const parameterId = Number(key.split(":")[1]);
    return this.sheet.columns.find((each) => each.parameterId === parameterId)?.unit ?? null;
  }

  /** Enter or Tab with this text in a cell: handed over at once where it may be, else it waits in the cell. */
  type(key: CellKey, typed: string, unit: string | null = this.unitAt(key)): Outcome {
    const view = this.view(key);
    const watched = this.sheet.watch.get(key);
    if (!view.isOpen || !watched) return "nothing";
    const known = this.#state.drafts.get(key);
    const text = completeAnswer(typed, watched).trim();
    if (text === "") {
      if (known) this.#step(putDraft(this.#state, key, null));
      return "nothing";
    }
    if (view.stage === "refused")
      this.#outbox.takeBack(lastItem(this.#outbox.snapshot().items, key)?.reading.uuid ?? "");
    const draft: Draft = { text, unit, block: known?.block ?? null, confirmed: false };
    const isSame = known !== undefined && known.text === text && known.unit === unit;
    const ready = isReady(draft, this.judge(key, draft));
    if (draft.block === null && ready && this.#taken) {
      this.#send([[key, draft]]);
      return "sent";
    }
    if (!isSame) this.#step(putDraft(this.#state, key, draft));
    return "waits";
  }

  /** "It really shows this": hands the value over, or marks it in its block. Answers whether there was anything to confirm. */
  confirm(key: CellKey): boolean {
    const draft = this.#state.drafts.get(key);
    if (!draft) return this.#confirmStored(key);
    const confirmed = { ...draft, confirmed: true };
    if (!isReady(confirmed, this.judge(key, confirmed)) || !this.#taken) return false;
    if (draft.block === null) this.#send([[key, confirmed]]);
    else this.#step(putDraft(this.#state, key, confirmed));
    return true;
  }

  #confirmStored(key: CellKey): boolean {
    const item = lastItem(this.#outbox.snapshot().items, key);
    if (!item || itemView(key, item).need !== "confirm") return false;
    this.#outbox.follow(item.reading.uuid, "confirmation", {});
    return true;
  }

  clear(key: CellKey): void {
    if (this.#state.drafts.has(key)) this.#step(putDraft(this.#state, key, null));
  }

  /** Opens a stored cell for a new measurement. */
  reopen(key: CellKey): void {
    this.#reopened = new Set(this.#reopened).add(key);
    this.touch();
  }

  paste(
    from: { row: number; column: number },
    block: readonly (readonly string[])[],
  ): Pick<Pasted, "placed" | "lost"> {
    const stored: string[] = [];
    const kept = block.map((texts, down) =>
      texts.map((text, right) => {
        const key = this.keyAt(from.row + down, from.column + right);
        if (text === "" || key === null || !this.sheet.watch.has(key)) return text;
        if (!this.view(key).isOpen) stored.push(`“${text}”: a value has been sent from this cell already`);
        return this.view(key).isOpen ? completeAnswer(text, this.sheet.watch.get(key)) : "";
      }),
    );
    const { state, placed, lost } = pasteBlock(this.#state, this.sheet, from, kept);
    if (placed > 0) this.#step(state);
    return { placed, lost: [...lost, ...stored] };
  }

  /** How many pasted values wait, and how many of them could not be sent yet. */
  block(): { size: number; unready: number } {
    const all = [...this.#state.drafts].filter(([, draft]) => draft.block !== null);
    return {
      size: all.length,
      unready: all.filter(([key, draft]) => !isReady(draft, this.judge(key, draft))).length,
    };
  }

  /** Hands the pasted values over, all or none. Answers how many. */
  sendBlock(): number {
    const { size, unready } = this.block();
    if (size === 0 || unready > 0 || !this.#taken) return 0;
    this.#send([...this.#state.drafts].filter(([, draft]) => draft.block !== null));
    return size;
  }

  undo(): void {
    this.#step(undo(this.#state));
  }
  redo(): void {
    this.#step(redo(this.#state));
  }

  /** What waits for the person, in the order of the sheet. */
  waiting(): CellView[] {
    const keys = this.sheet.rows.flatMap((row) =>
      this.sheet.columns.map((column) => cellKey(row.pointId, column.parameterId)),
    );
    return keys
      .map((key) => this.view(key))
      .filter((view) => view.need === "confirm" || view.need === "mend");
  }

  /** The last reading of a cell in the unit of its column, as it stands in an empty cell. */
  lastValue(key: CellKey): { value: number; decimals: number } | null {
    const watched = this.sheet.watch.get(key);
    const last = watched?.recent[0];
    if (!watched || !last || last.value === null || last.qualifier !== "") return null;
    const value = inUnit(last.value, watched.parameter.unit, this.unitAt(key));
    return value === null ? null : { value, decimals: watched.parameter.decimals };
  }

  #send(drafts: readonly [CellKey, Draft][]): void {
    const taken = this.#taken;
    if (!taken) return;
    for (const [key, draft] of drafts) {
      const watched = this.sheet.watch.get(key);
      const verdict = this.judge(key, draft);
      if (!watched || !verdict) continue;
      const typed = { text: draft.text, unit: draft.unit, takenAt: taken.at ?? this.#now() };
      const how = {
        source: "grid",
        takenBy: taken.by,
        confirmed: draft.confirmed,
        uuid: this.#newUuid(),
      } as const;
      this.#outbox.add(toParcel(watched, typed, verdict, how));
      this.#reopened.delete(key);
    }
    this.#step(
      handOver(
        this.#state,
        drafts.map(([key]) => key),
      ),
    );
  }

  #step(state: GridState): void {
    this.#state = state;
    this.touch();
  }
}
