import { atMost } from "@/lib/nearly";
import type { AnswerMeaning } from "@/modules/methods/model";
import type {
  Bounds,
  LimitsInForce,
  OrderedBound,
  ReadingValue,
  Reason,
  Side,
  Status,
  StatusVerdict,
} from "../model";
import type { Change24h } from "./change-24h";
import {
  clip,
  type PossibleContext,
  type PossibleValues,
  plausibleRange,
  shareAbove,
  shareBelow,
  statedValues,
} from "./possible-values";
import { sentenceFor } from "./status-sentence";

/** Everything a judgement rests on; numbers in the canonical unit. */
export interface JudgeInput extends PossibleContext {
  readonly reading: ReadingValue;
  readonly limits: LimitsInForce;
  /** From `greatestChange24h`; null when nothing was there to compare. */
  readonly change: Change24h | null;
  /** For yes/no and choices: what the answer says by itself. */
  readonly answerMeans?: AnswerMeaning;
  /** How numbers are shown in the sentence. */
  readonly decimals: number;
  readonly unit: string;
}

type Ungrounded = Omit<StatusVerdict, "sentence">;

/**
 * What is the status of a reading? The one rule, the same in the browser and on the server.
 *
 * Precedence: implausible > (no limits) > out > cannot be judged > watch > within. Limits are inclusive; numbers equal
 * but for rounding (1e-9) count as equal. Implausible comes before everything, also without limits; a version with
 * no bound but a target judges nothing.
 *
 * A value with a qualifier is a set of possible values, cut to the plausible range: it is implausible, out, watch or
 * within only if *every* possible value is; a mixture cannot be judged ("<0.05" against an upper limit of 0.0075;
 * also a mixture of within and watch). It has no change in 24 h: where only the change is limited it cannot be judged,
 * else the reasons say that the change was left out. Without an earlier reading in 24 h no change is found.
 * Yes/no and choices are judged by what the answer means, unless the limits are suspended; texts never.
 * Throws RangeError when the value is not finite.
 */
export function judgeReading(input: JudgeInput): StatusVerdict {
  const verdict = decide(input);
  return { ...verdict, sentence: sentenceFor(input, verdict.reasons) };
}

function decide(input: JudgeInput): Ungrounded {
  const { kind, limits, reading } = input;
  if (kind === "text" || kind === "choice" || kind === "yes-no") return decideAnswer(input);
  const stated = statedValues(reading, input);
  if (stated === null) return one("unjudged", null, { code: "no-number" });
  const range = plausibleRange(input);
  const possible = clip(stated, range);
  if (possible === "below") {
    return one("implausible", "low", {
      code: "below-plausible",
      value: edge(stated, "to"),
      limit: range.from,
    });
  }
  if (possible === "above") {
    return one("implausible", "high", {
      code: "above-plausible",
      value: edge(stated, "from"),
      limit: range.to,
    });
  }
  if (limits.state === "none") return one("none", null, { code: "no-limits" });
  if (limits.state === "suspended")
    return one("none", null, { code: "limits-suspended", reason: limits.reason });
  return decideByBounds(input, possible, limits.bounds);
}

function decideAnswer({ kind, limits, reading, answerMeans = "none" }: JudgeInput): Ungrounded {
  if (limits.state === "suspended")
    return one("none", null, { code: "limits-suspended", reason: limits.reason });
  if (kind === "text" || answerMeans === "none") return one("none", null, { code: "no-limits" });
  return one(answerMeans, null, { code: "answer", answer: reading.text });
}

function decideByBounds(input: JudgeInput, possible: PossibleValues, bounds: Bounds): Ungrounded {
  const zones = bySide(possible, bounds);
  const changeLimit = bounds.greatestChange24h;
  const plain = input.reading.qualifier === "";
  const numeric = SIDES.some(
    (each) => bounds[each.tolerance] !== undefined || bounds[each.watch] !== undefined,
  );
  if (!numeric && changeLimit === undefined) return one("none", null, { code: "no-limits" });

  const tooGreat = plain ? changeReason(input.change, changeLimit) : null;
  const unseen: Reason[] = changeLimit !== undefined && !plain ? [{ code: "change-not-judged" }] : [];
  if (zones.status === "out")
    return { ...zones, reasons: [...zones.reasons, ...(tooGreat ? [tooGreat] : unseen)] };
  if (tooGreat)
    return { status: "out", side: "change", reasons: [tooGreat, ...zones.reasons.filter(isFinding)] };
  if (!numeric && !plain) return { status: "unjudged", side: null, reasons: unseen };
  return { ...zones, reasons: [...zones.reasons, ...unseen] };
}

const SIDES = [
  { side: "low", tolerance: "toleranceLow", watch: "watchLow", share: shareBelow, end: "to", word: "below" },
  {
    side: "high",
    tolerance: "toleranceHigh",
    watch: "watchHigh",
    share: shareAbove,
    end: "from",
    word: "above",
  },
] as const;

/** The status by tolerance and watch limits alone: out, else undecided, else watch, else within. */
function bySide(possible: PossibleValues, bounds: Bounds): Ungrounded {
  const undecided: Reason[] = [];
  for (const level of ["tolerance", "watch"] as const) {
    for (const each of SIDES) {
      const bound: OrderedBound = each[level];
      const limit = bounds[bound];
      const share = limit === undefined ? "none" : each.share(possible, limit);
      if (limit === undefined || share === "none") continue;
      if (share === "some") undecided.push({ code: "bound-does-not-decide", bound, limit });
      else if (undecided.length === 0) {
        const reason: Reason = { code: `${each.word}-${level}`, value: edge(possible, each.end), limit };
        return one(level === "tolerance" ? "out" : "watch", each.side, reason);
      }
    }
  }
  if (undecided.length > 0) return { status: "unjudged", side: null, reasons: undecided };
  return one("within", null, { code: "inside-limits" });
}

function changeReason(change: Change24h | null, limit: number | undefined): Reason | null {
  if (change === null || limit === undefined || atMost(change.change, limit)) return null;
  const { againstAt, againstValue } = change;
  return { code: "change-too-great", change: change.change, limit, againstValue, againstAt };
}

const isFinding = (reason: Reason) => reason.code !== "inside-limits";

/** The finite end of some values that stands for them in a reason. */
function edge(values: PossibleValues, end: "from" | "to"): number {
  const wanted = values[end];
  return Number.isFinite(wanted) ? wanted : values[end === "from" ? "to" : "from"];
}

function one(status: Status, side: Side | null, reason: Reason): Ungrounded {
  return { status, side, reasons: [reason] };
}
