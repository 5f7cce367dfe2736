import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { ReadingValue, Reason, StatusVerdict } from "../model";
import { decimalsIn, inUnit, readingInUnit, shownUnit } from "./in-unit";
import { sentenceFor } from "./status-sentence";

/** The grounds and the sentence of a verdict with their numbers in the unit that is shown; the status stays what it is. */
export function verdictInUnit(
  verdict: StatusVerdict,
  reading: ReadingValue,
  parameter: FacilityParameter,
  wanted: string | null,
): StatusVerdict {
  const unit = shownUnit(parameter, wanted);
  if (unit === parameter.unit) return verdict;
  const reasons = verdict.reasons.map((reason) => reasonInUnit(reason, parameter.unit, unit));
  const shown = {
    reading: readingInUnit(reading, parameter, unit),
    decimals: decimalsIn(parameter.decimals, parameter.unit, unit),
    unit: unitLabel(unit),
  };
  return { ...verdict, reasons, sentence: sentenceFor(shown, reasons) };
}

function reasonInUnit(reason: Reason, from: string | null, to: string | null): Reason {
  if (!("limit" in reason)) return reason;
  const level = (value: number) => inUnit(value, from, to) ?? value;
  if (reason.code === "change-too-great") {
    const difference = (value: number) => level(value) - level(0);
    return {
      ...reason,
      change: difference(reason.change),
      limit: difference(reason.limit),
      againstValue: level(reason.againstValue),
    };
  }
  if (reason.code === "bound-does-not-decide") return { ...reason, limit: level(reason.limit) };
  return { ...reason, value: level(reason.value), limit: level(reason.limit) };
}
