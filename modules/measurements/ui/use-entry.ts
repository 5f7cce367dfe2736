"use client";
import { useCallback, useState } from "react";
import { systemClock } from "@/lib/clock";
import type { WatchRow } from "../model";
import { cellKey } from "./grid-model";
import { alsoRead, lastItem, type Taken, toParcel } from "./hand-over";
import { judgeTyped, type TypedVerdict } from "./judge-typed";
import type { OutboxItem } from "./outbox";
import { useOutbox } from "./use-outbox";

/** What stands in a box that is open. `asked`: the person has pressed Enter or left it, so it says what is missing. */
export interface EntryDraft {
  readonly text: string;
  readonly unit: string | null;
  readonly asked: boolean;
}

export interface EntryCell {
  readonly row: WatchRow;
  readonly cell: string;
  readonly draft: EntryDraft;
  readonly verdict: TypedVerdict;
  /** What was last handed over here; its box is closed while nothing new is typed. */
  readonly item: OutboxItem | undefined;
  readonly isOpen: boolean;
  readonly change: (part: Partial<EntryDraft>) => void;
  /** Hands the value over where it may be; answers whether it was. */
  readonly commit: (how?: { confirmed?: boolean; text?: string }) => boolean;
  /** Opens a closed box again, for a new measurement. */
  readonly anew: () => void;
  /** Takes a refused value back into its box. */
  readonly mend: () => void;
  readonly explain: (text: string) => void;
  /** Confirms a stored value of which only the server knew that it is off. */
  readonly confirmStored: () => void;
}

function withDraft(drafts: ReadonlyMap<string, EntryDraft>, cell: string, draft: EntryDraft | null) {
  const next = new Map(drafts);
  if (draft === null) next.delete(cell);
  else next.set(cell, draft);
  return next;
}

/** The state of an entry sheet: what is typed, what the browser thinks of it, what has been handed over. */
export function useEntry(personId: number, taken: Taken | null) {
  const { outbox, state } = useOutbox(personId);
  const [drafts, setDrafts] = useState<ReadonlyMap<string, EntryDraft>>(new Map());

  const put = useCallback(
    (cell: string, draft: EntryDraft | null) => setDrafts((old) => withDraft(old, cell, draft)),
    [],
  );

  const cellOf = (row: WatchRow): EntryCell => {
    const cell = cellKey(row.pointId, row.parameter.id);
    const empty: EntryDraft = { text: "", unit: row.unit, asked: false };
    const draft = drafts.get(cell) ?? empty;
    const item = lastItem(state.items, cell);
    const takenAt = taken?.at ?? systemClock.now();
    const also = alsoRead(state.items, cell);
    const judge = (text: string) => judgeTyped(row, { text, unit: draft.unit, takenAt }, also);
    return {
      row,
      cell,
      draft,
      item,
      verdict: judge(draft.text),
      isOpen: drafts.has(cell) || item === undefined,
      change: (part) => put(cell, { ...draft, asked: false, ...part }),
      commit: ({ confirmed = false, text = draft.text } = {}) => {
        const verdict = judge(text);
        if (verdict.state === "empty") return false;
        const isOff = verdict.state === "judged" && verdict.mustBeConfirmed;
        if (taken === null || verdict.state === "wrong" || (isOff && !confirmed)) {
          put(cell, { ...draft, text, asked: true });
          return false;
        }
        const how = { source: "entry", takenBy: taken.by, confirmed, uuid: crypto.randomUUID() } as const;
        outbox.add(toParcel(row, { text, unit: draft.unit, takenAt }, verdict, how));
        put(cell, null);
        return true;
      },
      anew: () => put(cell, empty),
      mend: () => {
        if (!item) return;
        outbox.takeBack(item.reading.uuid);
        put(cell, { text: item.reading.typedText, unit: item.reading.typedUnit, asked: true });
      },
      explain: (text) => item && outbox.follow(item.reading.uuid, "explanation", { text }),
      confirmStored: () => item && outbox.follow(item.reading.uuid, "confirmation", {}),
    };
  };

  /** How many boxes wait for the person: to be confirmed or mended. */
  const waiting = [...drafts.values()].filter((draft) => draft.asked && draft.text.trim() !== "").length;
  return { cellOf, waiting, outbox, state };
}
