import { WellStrip } from "@/lib/ui";
import type { Bounds, Status } from "@/modules/measurements/model";
import { shownValue } from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";

type Stored = Parameters<typeof shownValue>[0];

/** A reading's figure with its unit; what was typed stands beside it where that was another unit. */
export function ReadingFigure({ reading, parameter }: { reading: Stored; parameter: FacilityParameter }) {
  const { figure, unit, asTyped } = shownValue(reading, parameter);
  const isNumber = parameter.kind === "number" || parameter.kind === "count";
  return (
    <span className={isNumber ? "num" : ""}>
      {figure}
      {unit !== "" && <span className="unit">{unit}</span>}
      {asTyped !== null && (
        <span className="ml-2 font-sans text-sm font-normal text-ink-3">typed {asTyped}</span>
      )}
    </span>
  );
}

export interface LineStripProps {
  value: number | null;
  previous?: number | null;
  status: Status;
  bounds: Bounds | undefined;
  parameter: FacilityParameter;
  fluid?: boolean;
}

/** The well strip of one reading; nothing for answers, texts and what has no number. */
export function LineStrip({ value, previous, status, bounds, parameter, fluid }: LineStripProps) {
  if (parameter.kind !== "number" && parameter.kind !== "count") return null;
  if (value === null || bounds === undefined) return null;
  return (
    <WellStrip
      {...bounds}
      name={parameter.name}
      unit={parameter.unit ?? ""}
      value={value}
      previous={previous}
      status={status}
      decimals={parameter.decimals}
      possibleLow={parameter.plausible.low}
      possibleHigh={parameter.plausible.high}
      fluid={fluid}
    />
  );
}
