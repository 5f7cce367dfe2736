import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { Qualifier } from "../model";
import { formatValue } from "./format-value";

type Stored = {
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly typedText: string;
  readonly typedUnit: string | null;
};
type Shape = Pick<FacilityParameter, "kind" | "choices" | "decimals" | "unit">;

/** How a stored reading is written for people: its figure and unit apart, and what was typed where that was in another unit. */
export interface ShownValue {
  readonly figure: string;
  readonly unit: string;
  readonly asTyped: string | null;
}

/**
 * What does a stored reading look like on screen and paper?
 * @example shownValue({ value: 18, qualifier: "", answer: null, typedText: "64.4", typedUnit: "°F" }, { kind: "number", choices: [], decimals: 1, unit: "°C" }).figure // => "18.0"
 */
export function shownValue(reading: Stored, parameter: Shape): ShownValue {
  if (parameter.kind === "choice" || parameter.kind === "yes-no") {
    const label = parameter.choices.find((choice) => choice.code === reading.answer)?.label;
    return { figure: label ?? reading.answer ?? reading.typedText, unit: "", asTyped: null };
  }
  if (parameter.kind === "text") {
    return { figure: reading.answer ?? reading.typedText, unit: "", asTyped: null };
  }
  const figure = formatValue(
    { value: reading.value, qualifier: reading.qualifier, text: reading.typedText },
    parameter.decimals,
  );
  const isOther = reading.typedUnit !== null && reading.typedUnit !== parameter.unit;
  return {
    figure,
    unit: unitLabel(parameter.unit),
    asTyped: isOther ? `${reading.typedText} ${unitLabel(reading.typedUnit)}`.trim() : null,
  };
}
