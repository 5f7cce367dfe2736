import type { TotalVolume, VolumeComponent } from "../model";
import { componentVolume } from "./component-volume";
import { COVERAGE_FACTOR, combineCorrelated } from "./uncertainty";

/**
 * How much water does a system hold, summed over its pieces, and how surely?
 *
 * Formula: V = Σ V_i; u by GUM 5.1.2 (no correlation, the default) or 5.2.2 with one coefficient r between the pieces, for
 * when all were measured with the same tape; U = 2u. Units: litres. Domain: at least one component, 0 ≤ r ≤ 1;
 * RangeError outside it and for any component out of its domain.
 * Source: JCGM 100:2008 (GUM), 5.1.2, 5.2.2, 6.2.
 * Checked: tests/published/volume-uncertainty.test.ts.
 *
 * @example totalVolume([{ name: "pipework", shape: "free-litres", volumeL: { value: 40, standardUncertainty: 4 }, fillDepthM: null, displacementL: null, isAtSurface: false }]).expandedUncertaintyL // => 8
 */
export function totalVolume(components: readonly VolumeComponent[], correlation = 0): TotalVolume {
  if (components.length === 0) throw new RangeError("A volume needs at least one component.");
  const parts = components.map((component) => componentVolume(component));
  const standardUncertaintyL = combineCorrelated(
    parts.map((part) => part.standardUncertaintyL),
    correlation,
  );
  const surfaces = parts.map((part, index) => (components[index]?.isAtSurface ? part.surfaceAreaM2 : 0));
  return {
    volumeL: parts.reduce((sum, part) => sum + part.volumeL, 0),
    standardUncertaintyL,
    expandedUncertaintyL: COVERAGE_FACTOR * standardUncertaintyL,
    surfaceAreaM2: surfaces.reduce((sum, areaM2) => sum + areaM2, 0),
    components: parts,
  };
}
