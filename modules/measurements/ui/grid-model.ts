import type { WatchRow } from "../model";
import type { TimedValue } from "../rules/change-24h";
import { judgeTyped, type Typed, type TypedVerdict } from "./judge-typed";

/** The place of a value on the sheet: "point:parameter". */
export type CellKey = string;
export const cellKey = (pointId: number, parameterId: number): CellKey => `${pointId}:${parameterId}`;

export interface SheetRow {
  readonly pointId: number;
  readonly systemCode: string;
  readonly systemName: string;
  readonly pointName: string;
  readonly isDefaultPoint: boolean;
}
export interface SheetColumn {
  readonly parameterId: number;
  readonly name: string;
  /** The unit that stands in the header; a cell whose unit differs shows its own. */
  readonly unit: string | null;
}

/** What is where on the sheet. */
export interface Sheet {
  readonly rows: readonly SheetRow[];
  readonly columns: readonly SheetColumn[];
  readonly watch: ReadonlyMap<CellKey, WatchRow>;
}

/** A value that is typed and not handed over yet. */
export interface Draft {
  readonly text: string;
  readonly unit: string | null;
  /** A pasted value waits until the whole block is sent. */
  readonly block: number | null;
  /** In a block: a person said that it really shows this. */
  readonly confirmed: boolean;
}
export type Drafts = ReadonlyMap<CellKey, Draft>;

/** The unsent of the sheet, with what can be undone and done again. */
export interface GridState {
  readonly drafts: Drafts;
  readonly past: readonly Drafts[];
  readonly future: readonly Drafts[];
  readonly lastBlock: number;
}

export const EMPTY_GRID: GridState = { drafts: new Map(), past: [], future: [], lastBlock: 0 };
const MOST_STEPS = 200;

/** Lays a sheet out: a row per point in walking order (the default point of a system first), a column per parameter in the order in which points list them. */
export function layOutSheet(watched: readonly WatchRow[]): Sheet {
  const rows = new Map<number, SheetRow>();
  const units = new Map<number, { name: string; order: number; units: (string | null)[] }>();
  const watch = new Map<CellKey, WatchRow>();
  const places = new Map<number, number>();
  for (const each of watched) {
    const { pointId, systemCode, systemName, pointName, isDefaultPoint, parameter } = each;
    rows.set(pointId, { pointId, systemCode, systemName, pointName, isDefaultPoint });
    watch.set(cellKey(pointId, parameter.id), each);
    const place = places.get(pointId) ?? 0;
    places.set(pointId, place + 1);
    const known = units.get(parameter.id);
    units.set(parameter.id, {
      name: parameter.name,
      order: Math.min(known?.order ?? place, place),
      units: [...(known?.units ?? []), each.unit],
    });
  }
  const columns = [...units.entries()]
    .sort(([, a], [, b]) => a.order - b.order || a.name.localeCompare(b.name, "en"))
    .map(([parameterId, { name, units: all }]) => ({ parameterId, name, unit: mostCommon(all) }));
  const ordered = [...rows.values()];
  const systemAt = (row: SheetRow) => ordered.findIndex((each) => each.systemCode === row.systemCode);
  const walked = ordered
    .map((row) => ({ row, at: systemAt(row) }))
    .sort((a, b) => a.at - b.at || Number(b.row.isDefaultPoint) - Number(a.row.isDefaultPoint))
    .map(({ row }) => row);
  return { rows: walked, columns, watch };
}

function mostCommon(units: readonly (string | null)[]): string | null {
  const counts = new Map<string | null, number>();
  for (const unit of units) counts.set(unit, (counts.get(unit) ?? 0) + 1);
  return [...counts.entries()].sort((a, b) => b[1] - a[1])[0]?.[0] ?? null;
}

function step(state: GridState, drafts: Drafts): GridState {
  return { ...state, drafts, past: [...state.past, state.drafts].slice(-MOST_STEPS), future: [] };
}

/** Puts a draft into a cell, or empties it (null). */
export function putDraft(state: GridState, key: CellKey, draft: Draft | null): GridState {
  const drafts = new Map(state.drafts);
  if (draft === null) drafts.delete(key);
  else drafts.set(key, draft);
  return step(state, drafts);
}

/** Takes out what has been handed over: it is no longer unsent, so no step back or forward brings it back. */
export function handOver(state: GridState, keys: readonly CellKey[]): GridState {
  const without = (drafts: Drafts): Drafts => {
    if (!keys.some((key) => drafts.has(key))) return drafts;
    const left = new Map(drafts);
    for (const key of keys) left.delete(key);
    return left;
  };
  const clean = (steps: readonly Drafts[], next: Drafts) => {
    const all = steps.map(without);
    return all.filter((each, index) => !sameDrafts(each, all[index + 1] ?? next));
  };
  const drafts = without(state.drafts);
  return {
    ...state,
    drafts,
    past: clean(state.past, drafts),
    future: [...clean([...state.future].reverse(), drafts)].reverse(),
  };
}

function sameDrafts(a: Drafts, b: Drafts): boolean {
  return a.size === b.size && [...a].every(([key, draft]) => b.get(key) === draft);
}

/** One step back among the unsent; the same state when there is none. */
export function undo(state: GridState): GridState {
  const before = state.past.at(-1);
  if (!before) return state;
  const future = [state.drafts, ...state.future];
  return { ...state, drafts: before, past: state.past.slice(0, -1), future };
}

/** The step that was undone, done again. */
export function redo(state: GridState): GridState {
  const [next, ...future] = state.future;
  if (!next) return state;
  return { ...state, drafts: next, past: [...state.past, state.drafts], future };
}

/** What became of a pasted block. */
export interface Pasted {
  readonly state: GridState;
  readonly placed: number;
  /** Values that found no place: beyond the sheet, or where nothing is read. In words, with the place. */
  readonly lost: readonly string[];
}

/**
 * Lays a block from a spreadsheet onto the sheet from one cell to the right and down. Empty cells change nothing. A value
 * where nothing is read, or beyond the edge, is named and not laid anywhere else. One step for undo. Nothing is sent.
 */
export function pasteBlock(
  state: GridState,
  sheet: Sheet,
  from: { row: number; column: number },
  block: readonly (readonly string[])[],
): Pasted {
  const drafts = new Map(state.drafts);
  const number = state.lastBlock + 1;
  const lost: string[] = [];
  let placed = 0;
  block.forEach((texts, down) => {
    texts.forEach((text, right) => {
      if (text === "") return;
      const row = sheet.rows[from.row + down];
      const column = sheet.columns[from.column + right];
      if (!row || !column) {
        lost.push(`“${text}” would lie beyond the ${row ? "last column" : "last row"}`);
        return;
      }
      const key = cellKey(row.pointId, column.parameterId);
      const watched = sheet.watch.get(key);
      if (!watched) {
        lost.push(`“${text}”: ${column.name} is not read at ${row.systemCode}`);
        return;
      }
      drafts.set(key, { text, unit: column.unit ?? watched.unit, block: number, confirmed: false });
      placed += 1;
    });
  });
  return { state: { ...step(state, drafts), lastBlock: number }, placed, lost };
}

/** What the browser thinks of the draft in a cell; null where there is none. */
export function verdictAt(
  sheet: Sheet,
  key: CellKey,
  draft: Pick<Draft, "text" | "unit">,
  takenAt: number,
  also: readonly TimedValue[],
): TypedVerdict | null {
  const watched = sheet.watch.get(key);
  if (!watched) return null;
  const typed: Typed = { text: draft.text, unit: draft.unit, takenAt };
  return judgeTyped(watched, typed, also);
}

/** Whether a draft may be handed over: it reads as a value, and what is off has been confirmed. */
export function isReady(draft: Draft, verdict: TypedVerdict | null): boolean {
  if (verdict === null || verdict.state === "empty" || verdict.state === "wrong") return false;
  return verdict.state === "left-to-server" || !verdict.mustBeConfirmed || draft.confirmed;
}

/** A typed beginning of one answer, completed: "o" → "on" where no other answer begins so. Else the text as it is. */
export function completeAnswer(text: string, watched: WatchRow | undefined): string {
  const { kind, choices } = watched?.parameter ?? { kind: "text", choices: [] };
  if (kind !== "choice" && kind !== "yes-no") return text;
  const wanted = text.trim().toLowerCase();
  if (wanted === "") return text;
  const labels = choices.length > 0 ? choices.map((each) => each.label) : ["yes", "no"];
  const fitting = labels.filter((label) => label.toLowerCase().startsWith(wanted));
  const only = fitting.length === 1 ? fitting[0] : undefined;
  return only ?? text;
}

/** The next cell in which something is read, down the column and on to the top of the next. Null at the end. */
export function cellBelow(
  sheet: Sheet,
  row: number,
  column: number,
  by: 1 | -1 = 1,
): [number, number] | null {
  const height = sheet.rows.length;
  const all = height * sheet.columns.length;
  for (let index = column * height + row + by; index >= 0 && index < all; index += by) {
    const found: [number, number] = [index % height, Math.floor(index / height)];
    if (isRead(sheet, ...found)) return found;
  }
  return null;
}

/** The next cell in which something is read, along the row and on to the next row. Null at the end. */
export function cellBeside(
  sheet: Sheet,
  row: number,
  column: number,
  by: 1 | -1 = 1,
): [number, number] | null {
  const width = sheet.columns.length;
  const all = width * sheet.rows.length;
  for (let index = row * width + column + by; index >= 0 && index < all; index += by) {
    const found: [number, number] = [Math.floor(index / width), index % width];
    if (isRead(sheet, ...found)) return found;
  }
  return null;
}

function isRead(sheet: Sheet, row: number, column: number): boolean {
  const at = sheet.rows[row];
  const what = sheet.columns[column];
  return at !== undefined && what !== undefined && sheet.watch.has(cellKey(at.pointId, what.parameterId));
}
