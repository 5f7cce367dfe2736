import type { Side, Status } from "../model";
import type { CellKey } from "./grid-model";
import { statusOf } from "./hand-over";
import type { TypedVerdict } from "./judge-typed";
import type { OutboxItem, SendStage } from "./outbox";

/** What a person has to do about a cell: confirm, mend, or nothing; "block": it waits until its block is sent. */
export type Need = "confirm" | "mend" | "block" | null;

/** All that is painted in a cell and said about it. */
export interface CellView {
  readonly key: CellKey;
  /** False where nothing is read: the cell takes nothing. */
  readonly isRead: boolean;
  /** True where a value may be typed; a stored value is changed on its own page, with a reason. */
  readonly isOpen: boolean;
  readonly text: string;
  readonly unit: string | null;
  readonly status: Status | null;
  readonly side: Side | null;
  readonly stage: SendStage | "empty" | "draft";
  readonly need: Need;
  /** "below 6.5" */
  readonly ground: string;
  readonly sentence: string;
  readonly verdict: TypedVerdict | null;
  readonly readingId: number | null;
}

const NOTHING = {
  status: null,
  side: null,
  ground: "",
  sentence: "",
  verdict: null,
  readingId: null,
} as const;

/** An empty cell; `isRead` false: nothing is read here. */
export function emptyView(key: CellKey, isRead: boolean, unit: string | null): CellView {
  return { ...NOTHING, key, isRead, isOpen: isRead, text: "", unit, stage: "empty", need: null };
}

/** A cell whose value has been handed over. */
export function itemView(key: CellKey, item: OutboxItem): CellView {
  const { answer, stage, reading } = item;
  const isConfirmed = item.followers.some((each) => each.path === "confirmation" && each.stage !== "refused");
  const mustConfirm = stage === "sent" && answer?.mustBeConfirmed === true && !isConfirmed;
  return {
    key,
    isRead: true,
    isOpen: stage === "refused",
    text: reading.typedText,
    unit: reading.typedUnit,
    status: statusOf(item),
    side: answer?.side ?? null,
    stage,
    need: mustConfirm ? "confirm" : stage === "refused" ? "mend" : null,
    ground: "",
    sentence: item.sentence ?? answer?.sentence ?? "",
    verdict: null,
    readingId: answer?.readingId ?? null,
  };
}
