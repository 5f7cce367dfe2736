import { unitLabel } from "@/lib/units/factors";
import { needsConfirmation, type ReadingValue, type StatusVerdict, type WatchRow } from "../model";
import { greatestChange24h, type TimedValue } from "../rules/change-24h";
import { formatPair } from "../rules/format-value";
import { inUnit } from "../rules/in-unit";
import { parseValue } from "../rules/parse-value";
import { type Slip, suggestSlips } from "../rules/slips";
import { judgeReading } from "../rules/status";

/** What stands in an entry box, before anything is sent. */
export interface Typed {
  readonly text: string;
  /** The unit in which it is typed; null for answers, texts and bare numbers. */
  readonly unit: string | null;
  readonly takenAt: number;
}

/** What the browser thinks of a typed value. */
export type TypedVerdict =
  /** Nothing is typed. */
  | { readonly state: "empty" }
  /** It cannot be read as a value; the sentence says what to write. */
  | { readonly state: "wrong"; readonly sentence: string }
  /** Only the server can turn this unit into the canonical one; the status comes with its answer. */
  | { readonly state: "left-to-server"; readonly sentence: string }
  | {
      readonly state: "judged";
      readonly value: ReadingValue;
      readonly verdict: StatusVerdict;
      readonly mustBeConfirmed: boolean;
      /** What else may have been meant; shown as buttons, never applied by itself. */
      readonly slips: readonly Slip[];
    };

/**
 * What is the status of what is being typed? The same rule as on the server, with the limits that came with the row and its
 * newest readings; the server's answer decides. `also` are readings sent since the row was loaded.
 * @example judgeTyped(row, { text: "81,2", unit: "pH", takenAt }).state // "judged", implausible, slips offer 8.12
 */
export function judgeTyped(row: WatchRow, typed: Typed, also: readonly TimedValue[] = []): TypedVerdict {
  const { parameter } = row;
  if (typed.text.trim() === "") return { state: "empty" };
  const parsed = parseValue(typed.text, { kind: parameter.kind, choices: parameter.choices });
  if (!parsed.ok) return { state: "wrong", sentence: parsed.sentence };
  const value = parsed.value === null ? null : inUnit(parsed.value, typed.unit, parameter.unit);
  if (parsed.value !== null && value === null) {
    return { state: "left-to-server", sentence: "Its status is known once it has been sent." };
  }
  const reading: ReadingValue = { value, qualifier: parsed.qualifier, text: parsed.text };
  const verdict = verdictOn(row, reading, typed.takenAt, also);
  return {
    state: "judged",
    value: reading,
    verdict,
    mustBeConfirmed: needsConfirmation(verdict.status),
    slips: parsed.value === null || parsed.qualifier !== "" ? [] : slipsOf(row, parsed.value, typed, also),
  };
}

function verdictOn(
  row: WatchRow,
  reading: ReadingValue,
  takenAt: number,
  also: readonly TimedValue[],
): StatusVerdict {
  const { parameter, limits } = row;
  const answerMeans = parameter.choices.find((choice) => choice.code === reading.text)?.means;
  return judgeReading({
    kind: parameter.kind,
    plausible: parameter.plausible,
    mayBeNegative: parameter.mayBeNegative,
    reading,
    limits,
    change: greatestChange24h({ id: "typed", takenAt, ...reading }, comparable(row, also)),
    decimals: parameter.decimals,
    unit: unitLabel(parameter.unit),
    ...(answerMeans ? { answerMeans } : {}),
  });
}

/** Earlier readings that may stand for a change: an implausible one does not. */
function comparable(row: WatchRow, also: readonly TimedValue[]): TimedValue[] {
  return [...row.recent.filter((each) => each.status !== "implausible"), ...also];
}

function slipsOf(row: WatchRow, typed: number, { unit }: Typed, also: readonly TimedValue[]): Slip[] {
  const { parameter, limits } = row;
  const recent = comparable(row, also).flatMap((each) =>
    each.value !== null && each.qualifier === "" ? [each.value] : [],
  );
  return suggestSlips({
    typed,
    typedUnit: unit,
    canonicalUnit: parameter.unit,
    acceptedUnits: parameter.acceptedUnits,
    decimals: parameter.decimals,
    recent,
    bounds: limits.state === "in-force" ? limits.bounds : null,
    plausible: parameter.plausible,
    toCanonical: (value, from) => inUnit(value, from, parameter.unit),
  });
}

/** What a slip's button writes into the box: the text and the unit. */
export function applySlip(typed: Typed, slip: Slip): Typed {
  if (slip.kind === "unit") return { ...typed, unit: slip.unit };
  const comma = typed.text.includes(",") && !typed.text.includes(".");
  const text = String(slip.value);
  return { ...typed, text: comma ? text.replace(".", ",") : text };
}

/** What stands on a slip's button: "8.12?" or "64.4 °F?". */
export function slipLabel(typed: Typed, slip: Slip): string {
  const meant = applySlip(typed, slip);
  const unit = slip.kind === "unit" ? unitLabel(slip.unit) : "";
  return `${meant.text.trim()}${unit === "" ? "" : `\u00a0${unit}`}?`;
}

/**
 * Why a value is off, in three or four words for the line under a box: "below 6.5", "above 18.0",
 * "changed by 1.2 in 24 h". Empty where the status says it all. A limit stands there with all the digits that it was
 * given; one that was `converted` with as many as it takes to tell it from the value.
 */
export function shortGround(verdict: StatusVerdict, decimals: number, converted = false): string {
  const reason = verdict.reasons[0];
  if (!reason || !("limit" in reason)) return "";
  if (reason.code === "bound-does-not-decide") return "";
  if (reason.code === "change-too-great") {
    const { change, limit } = reason;
    const text = converted ? formatPair(change, limit, decimals)[0] : fixed(change, decimals);
    return `changed by ${text} in 24 h`;
  }
  const limit = converted
    ? formatPair(reason.value, reason.limit, decimals)[1]
    : fixed(reason.limit, decimals);
  return `${reason.code.startsWith("below") ? "below" : "above"} ${limit}`;
}

/** At least the parameter's decimals, more where the number has them. */
function fixed(value: number, decimals: number): string {
  const full = String(Number(value.toPrecision(12)));
  const text = (full.split(".")[1] ?? "").length > decimals ? full : value.toFixed(decimals);
  return text.replace("-", "\u2212");
}
