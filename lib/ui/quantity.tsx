import { numberText } from "./number-text";

export interface QuantityProps {
  /** Null shows a dash with a spoken "no value". */
  value: number | null | undefined;
  decimals: number;
  unit?: string;
  /** "<" or ">" before the figure. */
  qualifier?: string;
  className?: string;
}

/** A figure with its unit: fixed decimals, mono and tabular, the unit small and grey after a thin space. */
export function Quantity({ value, decimals, unit, qualifier, className = "" }: QuantityProps) {
  if (value === null || value === undefined) {
    return (
      <span className={`num text-ink-3 ${className}`}>
        <span aria-hidden="true">–</span>
        <span className="sr-only">no value</span>
      </span>
    );
  }
  return (
    <span className={`num ${className}`}>
      {qualifier}
      {numberText(value, decimals)}
      {unit !== undefined && unit !== "" && <span className="unit">{unit}</span>}
    </span>
  );
}
