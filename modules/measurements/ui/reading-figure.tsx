import { Quantity } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { Qualifier } from "../model";
import { formatValue } from "../rules/format-value";

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
  if (qualifier !== "") {
    // a detection limit keeps its digits: "<0.05" is not "<0.1"
    const unit = withUnit ? unitLabel(parameter.unit) : "";
    return (
      <span className={`num ${className}`}>
        {formatValue({ value, qualifier, text: typedText }, parameter.decimals)}
        {unit !== "" && <span className="unit">{unit}</span>}
      </span>
    );
  }
  return (
    <Quantity
      className={className}
      value={value}
      decimals={parameter.decimals}
      {...(withUnit ? { unit: unitLabel(parameter.unit) } : {})}
    />
  );
}
