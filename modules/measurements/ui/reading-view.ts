import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { JudgementCause, Qualifier, ReadingSource, Side, Status } from "../model";
import { formatValue } from "../rules/format-value";

/** One version of a reading as its page shows it. */
export interface ReadingVersion {
  readonly id: number;
  readonly typedText: string;
  readonly typedUnit: string | null;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly takenAt: number;
  readonly enteredAt: number;
  readonly takenBy: number;
  readonly enteredBy: number;
  readonly methodId: number | null;
  readonly instrumentId: number | null;
  readonly source: ReadingSource;
  readonly note: string | null;
  readonly correctionReason: string | null;
  readonly confirmedBy: number | null;
  readonly confirmedAt: number | null;
  readonly voidedBy: number | null;
  readonly voidedAt: number | null;
  readonly voidReason: string | null;
}

export interface JudgementRow {
  readonly id: number;
  readonly readingId: number;
  readonly status: Status;
  readonly side: Side | null;
  readonly sentence: string;
  readonly cause: JudgementCause;
  readonly judgedAt: number;
  readonly ruleVersion: number;
}

export interface ExplanationRow {
  readonly id: number;
  readonly readingId: number;
  readonly text: string;
  readonly explainedBy: number;
  readonly explainedAt: number;
}

/** Why it was judged, in words. */
export const CAUSE_WORDS: Readonly<Record<JudgementCause, string>> = {
  entered: "when it was entered",
  "late-reading": "again, because an earlier reading came late",
  correction: "again, because of a correction",
  "new-limits": "again, because limits changed",
  delivery: "again, because readings came in bulk",
  withdrawal: "again, because readings were withdrawn",
  voided: "again, because a reading was struck out",
};

/** By which way it came, in words. */
export const SOURCE_WORDS: Readonly<Record<ReadingSource, string>> = {
  entry: "typed on the system's page",
  grid: "typed in the desk grid",
  import: "brought in with a file",
  round: "read on a round",
  derived: "computed by the product",
};

/** The value as it was typed, with the unit in which it was typed: "64,4 °F". */
export function asTyped({ typedText, typedUnit }: Pick<ReadingVersion, "typedText" | "typedUnit">): string {
  const unit = unitLabel(typedUnit);
  return unit === "" ? typedText : `${typedText}\u00a0${unit}`;
}

/** The value as it counts, in the canonical unit: "18.0 °C", "<0.05 mg/L", "not seen". */
export function asCounted(version: ReadingVersion, parameter: FacilityParameter): string {
  if (version.answer !== null) {
    return parameter.choices.find((each) => each.code === version.answer)?.label ?? version.answer;
  }
  const text = version.typedText;
  const shown = formatValue({ value: version.value, qualifier: version.qualifier, text }, parameter.decimals);
  const unit = unitLabel(parameter.unit);
  return unit === "" || version.value === null ? shown : `${shown}\u00a0${unit}`;
}
