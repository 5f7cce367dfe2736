import { numberText, Quantity } from "@/lib/ui";
import type { Measured, VolumeUnit } from "../model";
import { shownVolume } from "./volume-text";

type VolumeQuantityProps = {
  volumeL: Measured | null;
  unit: VolumeUnit;
  /** Without its uncertainty: in a list, where the figure is rounded to what the uncertainty bears. */
  short?: boolean;
};

/** A volume with its expanded uncertainty (k = 2), in the reader's unit. */
export function VolumeQuantity({ volumeL, unit, short = false }: VolumeQuantityProps) {
  if (volumeL === null) return <Quantity value={null} decimals={0} />;
  const { value, expanded, decimals } = shownVolume(volumeL, unit);
  if (short) return <Quantity value={value} decimals={decimals} unit={unit} />;
  return (
    <span className="whitespace-nowrap">
      <Quantity value={value} decimals={decimals} unit={unit} />
      {value !== 0 && (
        <span className="ml-2 text-sm font-normal text-ink-3">
          {expanded === 0 ? "no uncertainty given" : `± ${numberText(expanded, decimals)} (k = 2)`}
        </span>
      )}
    </span>
  );
}
