import { Quantity } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { Qualifier } from "../model";

type Figure = {
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly typedText: string;
};

/** A reading as people write it: fixed decimals and unit, or the words of its answer. */
export function ReadingFigure({
  reading,
  parameter,
  withUnit = true,
  className = "",
}: {
  reading: Figure;
  parameter: Pick<FacilityParameter, "decimals" | "unit" | "choices">;
  withUnit?: boolean;
  className?: string;
}) {
  const { value, qualifier, answer, typedText } = reading;
  if (answer !== null) {
    const label = parameter.choices.find((each) => each.code === answer)?.label ?? answer;
    return <span className={className}>{label}</span>;
  }
  if (value === null) return <span className={`num ${className}`}>{qualifier || typedText}</span>;
  return (
    <Quantity
      className={className}
      value={value}
      decimals={parameter.decimals}
      qualifier={qualifier}
      {...(withUnit ? { unit: unitLabel(parameter.unit) } : {})}
    />
  );
}
