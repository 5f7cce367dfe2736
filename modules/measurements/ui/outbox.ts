import { ApiProblem, NetworkProblem, sendCommand } from "@/lib/ui/api";
import type { ReadingAnswer, ReadingSource, Status } from "../model";

/** One value as it is sent; shape of `readingInput`. */
export interface OutgoingReading {
  readonly uuid: string;
  readonly pointId: number;
  readonly parameterId: number;
  readonly typedText: string;
  readonly typedUnit: string | null;
  readonly takenAt: number;
  readonly takenBy: number | null;
  readonly methodId: number | null;
  readonly instrumentId: number | null;
  readonly confirmed: boolean;
}

/**
 * `queued`: about to go. `sending`: on its way. `waiting`: could not be sent, tried again by itself. `sent`: stored and
 * acknowledged. `refused`: the server said no; a person must mend it.
 */
export type SendStage = "queued" | "sending" | "waiting" | "sent" | "refused";

/** Something said about a reading once it is stored: sent after it, tried again like it. */
export interface Follower {
  readonly key: string;
  readonly path: "explanation" | "confirmation";
  readonly body: Readonly<Record<string, unknown>>;
  readonly stage: SendStage;
  readonly sentence: string | null;
}

export interface OutboxItem {
  /** Where it was typed: "point:parameter". */
  readonly cell: string;
  /** For sentences: "KELP-01, Temperature 13.4 °C". */
  readonly label: string;
  readonly source: Extract<ReadingSource, "entry" | "grid">;
  readonly reading: OutgoingReading;
  /** Canonical value, for the change of what is typed next; null where there is none. */
  readonly canonical: number | null;
  /** What the browser thought of it. */
  readonly guessed: Status | null;
  readonly stage: SendStage;
  readonly answer: ReadingAnswer | null;
  /** Why it is waiting or refused. */
  readonly sentence: string | null;
  readonly followers: readonly Follower[];
}

export interface OutboxState {
  readonly items: readonly OutboxItem[];
  /** Since when nothing gets through; null while all is well. */
  readonly stuckSince: number | null;
  /** The session has ended: nothing more is tried until somebody signs in. */
  readonly signedOut: boolean;
}

type Send = typeof sendCommand;
type Keep = Pick<Storage, "getItem" | "setItem" | "removeItem">;

export interface OutboxOptions {
  /** Kept apart by person, so that nobody sends what another typed at the same tablet. */
  readonly personId: number;
  readonly keep: Keep | null;
  readonly send?: Send;
  readonly now: () => number;
  /** Waits; answers how to stop waiting. */
  readonly later: (run: () => void, ms: number) => () => void;
}

const AT_ONCE = 4;
const PAUSES_MS = [1_500, 4_000, 10_000, 30_000] as const;
const EMPTY: OutboxState = { items: [], stuckSince: null, signedOut: false };

/** Refusals that pass by themselves: a busy or restarting server, a lost session. */
const isPassing = (status: number) => status >= 500 || status === 429 || status === 401 || status === 408;

/**
 * What was confirmed and is to be stored. Every value goes at once, with its own UUID, which is its idempotency key as
 * well: sent again it is still one reading. What cannot be sent is kept (also over a reload of the page) and tried again.
 */
export class Outbox {
  readonly #options: OutboxOptions;
  readonly #send: Send;
  readonly #listeners = new Set<() => void>();
  #state: OutboxState;
  #failures = 0;
  #stopWaiting: (() => void) | null = null;

  constructor(options: OutboxOptions) {
    this.#options = options;
    this.#send = options.send ?? sendCommand;
    this.#state = this.#read();
  }

  subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };
  snapshot = (): OutboxState => this.#state;

  /** Takes a confirmed value and sends it. */
  add(item: Pick<OutboxItem, "cell" | "label" | "source" | "reading" | "canonical" | "guessed">): void {
    const fresh: OutboxItem = { ...item, stage: "queued", answer: null, sentence: null, followers: [] };
    this.#set({ ...this.#state, items: [...this.#state.items, fresh] });
    this.#pump();
  }

  /** Says something about a reading: at once where it is stored, else right after it. */
  follow(uuid: string, path: Follower["path"], body: Follower["body"]): void {
    const follower: Follower = { key: crypto.randomUUID(), path, body, stage: "queued", sentence: null };
    this.#change(uuid, (item) => ({ ...item, followers: [...item.followers, follower] }));
    this.#pump();
  }

  /** Takes a refused value out, to be mended in its box. Anything else stays. */
  takeBack(uuid: string): void {
    const items = this.#state.items.filter((each) => each.reading.uuid !== uuid || each.stage !== "refused");
    this.#set({ ...this.#state, items });
  }

  /** Forgets what is stored, for a page that begins anew. What is not sent stays. */
  forgetSent(): void {
    this.#set({ ...this.#state, items: this.#state.items.filter((each) => !isDone(each)) });
  }

  /** Tries again now what could not be sent (the network is back, somebody pressed the button). */
  retry = (): void => {
    this.#stopWaiting?.();
    this.#stopWaiting = null;
    const again = <T extends { stage: SendStage }>(each: T): T =>
      each.stage === "waiting" ? { ...each, stage: "queued" } : each;
    const items = this.#state.items.map((item) => ({ ...again(item), followers: item.followers.map(again) }));
    this.#set({ ...this.#state, items, signedOut: false });
    this.#pump();
  };

  #pump(): void {
    if (this.#state.signedOut) return;
    let free = AT_ONCE - this.#state.items.filter(isMoving).length;
    for (const item of this.#state.items) {
      if (free <= 0) return;
      if (isMoving(item)) continue;
      if (item.stage === "queued") {
        free -= 1;
        void this.#sendItem(item);
      } else if (item.stage === "sent") {
        const next = item.followers.find((each) => each.stage === "queued");
        if (!next) continue;
        free -= 1;
        void this.#sendFollower(item, next);
      }
    }
  }

  async #sendItem({ reading, source }: OutboxItem): Promise<void> {
    const { uuid } = reading;
    this.#change(uuid, (item) => ({ ...item, stage: "sending", sentence: null }));
    try {
      const body = { source, readings: [reading] };
      const { data } = await this.#send<{ data: { readings: ReadingAnswer[] } }>("/api/v1/readings", body, {
        idempotencyKey: uuid,
      });
      this.#gotThrough();
      this.#change(uuid, (item) => ({ ...item, stage: "sent", answer: data.readings[0] ?? null }));
    } catch (error) {
      const { stage, sentence } = this.#failed(error);
      this.#change(uuid, (item) => ({ ...item, stage, sentence }));
    }
    this.#pump();
  }

  async #sendFollower({ reading, answer }: OutboxItem, follower: Follower): Promise<void> {
    const set = (change: Partial<Follower>) =>
      this.#change(reading.uuid, (item) => ({
        ...item,
        followers: item.followers.map((each) => (each.key === follower.key ? { ...each, ...change } : each)),
      }));
    set({ stage: "sending", sentence: null });
    try {
      const path = `/api/v1/readings/${answer?.readingId ?? 0}/${follower.path}`;
      await this.#send(path, follower.body, { idempotencyKey: follower.key });
      this.#gotThrough();
      set({ stage: "sent" });
    } catch (error) {
      set(this.#failed(error));
    }
    this.#pump();
  }

  #gotThrough(): void {
    this.#failures = 0;
    if (this.#state.stuckSince !== null) {
      this.#set({ ...this.#state, stuckSince: null });
      this.retry();
    }
  }

  #failed(error: unknown): { stage: SendStage; sentence: string } {
    const isLost =
      error instanceof NetworkProblem || (error instanceof ApiProblem && isPassing(error.status));
    if (!isLost) {
      const sentence = error instanceof Error ? error.message : "The server refused it without saying why.";
      return { stage: "refused", sentence };
    }
    const signedOut = error instanceof ApiProblem && error.status === 401;
    const stuckSince = this.#state.stuckSince ?? this.#options.now();
    this.#set({ ...this.#state, stuckSince, signedOut: this.#state.signedOut || signedOut });
    if (!signedOut && this.#stopWaiting === null) {
      const pause = PAUSES_MS[Math.min(this.#failures, PAUSES_MS.length - 1)] ?? 30_000;
      this.#failures += 1;
      this.#stopWaiting = this.#options.later(this.retry, pause);
    }
    return { stage: "waiting", sentence: error.message };
  }

  #change(uuid: string, change: (item: OutboxItem) => OutboxItem): void {
    const items = this.#state.items.map((each) => (each.reading.uuid === uuid ? change(each) : each));
    this.#set({ ...this.#state, items });
  }

  #set(state: OutboxState): void {
    this.#state = state;
    this.#write();
    for (const listener of this.#listeners) listener();
  }

  get #place(): string {
    return `stillwell.outbox.${this.#options.personId}`;
  }

  /** What an earlier page of this tab could not send; what was on its way is sent again, which stores nothing twice. */
  #read(): OutboxState {
    try {
      const text = this.#options.keep?.getItem(this.#place);
      if (!text) return EMPTY;
      const anew = <T extends { stage: SendStage }>(each: T): T =>
        each.stage === "sent" || each.stage === "refused" ? each : { ...each, stage: "queued" };
      const items = (JSON.parse(text) as OutboxItem[]).map((item) => ({
        ...anew(item),
        followers: item.followers.map(anew),
      }));
      return { ...EMPTY, items };
    } catch (error) {
      if (error instanceof SyntaxError || error instanceof DOMException) return EMPTY;
      throw error;
    }
  }

  #write(): void {
    const unsent = this.#state.items.filter((each) => !isDone(each));
    try {
      if (unsent.length === 0) this.#options.keep?.removeItem(this.#place);
      else this.#options.keep?.setItem(this.#place, JSON.stringify(unsent));
    } catch (error) {
      // a full or forbidden store: the values are still in this page and still go out
      if (!(error instanceof DOMException)) throw error;
    }
  }
}

function isMoving(item: OutboxItem): boolean {
  return item.stage === "sending" || item.followers.some((each) => each.stage === "sending");
}

/** Stored, with all that was said about it. */
function isDone(item: OutboxItem): boolean {
  return item.stage === "sent" && item.followers.every((each) => each.stage === "sent");
}

/** How many values are stored, on their way, and not sent (waiting or refused). */
export function countOutbox({ items }: OutboxState): { sent: number; moving: number; notSent: number } {
  const sent = items.filter((each) => each.stage === "sent").length;
  const notSent = items.filter((each) => each.stage === "waiting" || each.stage === "refused").length;
  return { sent, notSent, moving: items.length - sent - notSent };
}
