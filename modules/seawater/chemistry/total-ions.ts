/** Chlorinity 1 in g/kg is this practical salinity. */
const SALINITY_PER_CHLORINITY = 1.80655;

/**
 * Whose boron to salinity ratio: Uppström 1974 or Lee et al. 2010 (4 % more). It moves DIC by about 4 µmol/kg and
 * aragonite saturation by 0.2 %, so a result names it.
 */
export type BoronRatio = "uppstrom-1974" | "lee-2010";

/** What reference seawater holds in proportion to its salinity (Dickson, Sabine and Christian 2007, chapter 5). */
export const TOTALS = {
  sulfate: { fractionOfChlorinity: 0.14, gPerMol: 96.062 },
  fluoride: { fractionOfChlorinity: 0.000067, gPerMol: 18.998 },
  calcium: { fractionOfChlorinity: 0.02128, gPerMol: 40.087 },
  boronUppstrom: { fractionOfChlorinity: 0.000232, gPerMol: 10.811 },
  boronLeeMolPerKgAt35: 0.0004326,
} as const;

function molPerKg(of: { fractionOfChlorinity: number; gPerMol: number }, salinityPsu: number): number {
  return ((of.fractionOfChlorinity / of.gPerMol) * salinityPsu) / SALINITY_PER_CHLORINITY;
}

export const totalSulfateMolPerKg = (salinityPsu: number) => molPerKg(TOTALS.sulfate, salinityPsu);
export const totalFluorideMolPerKg = (salinityPsu: number) => molPerKg(TOTALS.fluoride, salinityPsu);
export const totalCalciumMolPerKg = (salinityPsu: number) => molPerKg(TOTALS.calcium, salinityPsu);

export function totalBoronMolPerKg(salinityPsu: number, ratio: BoronRatio): number {
  return ratio === "uppstrom-1974"
    ? molPerKg(TOTALS.boronUppstrom, salinityPsu)
    : (TOTALS.boronLeeMolPerKgAt35 * salinityPsu) / 35;
}
