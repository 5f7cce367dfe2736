import type { Measured } from "../model";
import { LITRES_PER_CUBIC_METRE } from "./component-volume";
import { combineUncorrelated } from "./uncertainty";

/** How a system stands today against its volume of record. */
export type OperatingLevel = {
  /** Height of the water above (+) or below (−) the level of the determination, metres. */
  levelOffsetM: Measured;
  isDrained: boolean;
};

/** The level lies below the floor: the volume would be less than nothing. */
export class BelowFloorError extends RangeError {
  constructor() {
    super("The level lies further down than the system is deep: mark it as drained instead.");
    this.name = "BelowFloorError";
  }
}

/**
 * How much water does a system hold today? Good for level changes small enough that the surface keeps its area.
 *
 * Formula: V = V_record + 1000 · a · Δh; 0 when drained; u by GUM 5.1.2 with ∂V/∂a = 1000Δh and ∂V/∂Δh = 1000a.
 * Units: litres, square metres, metres. Domain: finite numbers, area ≥ 0, known area when Δh ≠ 0, result ≥ 0;
 * RangeError outside it. Source: JCGM 100:2008 (GUM), 5.1.2. Checked: tests/published/volume-operating.test.ts.
 *
 * @example operatingVolume({ value: 5000, standardUncertainty: 30 }, { value: 4, standardUncertainty: 0 }, { levelOffsetM: { value: -0.25, standardUncertainty: 0.01 }, isDrained: false }) // => { value: 4000, standardUncertainty: 50 }
 */
export function operatingVolume(
  recordL: Measured,
  surfaceAreaM2: Measured | null,
  level: OperatingLevel,
): Measured {
  if (level.isDrained) return { value: 0, standardUncertainty: 0 };
  const { levelOffsetM } = level;
  if (![recordL.value, levelOffsetM.value].every(Number.isFinite)) {
    throw new RangeError("The volume of record and the level must be finite numbers.");
  }
  if (levelOffsetM.value === 0 && levelOffsetM.standardUncertainty === 0) return recordL;
  if (surfaceAreaM2 === null || !(surfaceAreaM2.value > 0)) {
    throw new RangeError(
      "A changed level needs the area of the water's surface: mark the component that holds it.",
    );
  }
  const value = recordL.value + LITRES_PER_CUBIC_METRE * surfaceAreaM2.value * levelOffsetM.value;
  if (value < 0) throw new BelowFloorError();
  const standardUncertainty = combineUncorrelated([
    { sensitivity: 1, standardUncertainty: recordL.standardUncertainty },
    {
      sensitivity: LITRES_PER_CUBIC_METRE * levelOffsetM.value,
      standardUncertainty: surfaceAreaM2.standardUncertainty,
    },
    {
      sensitivity: LITRES_PER_CUBIC_METRE * surfaceAreaM2.value,
      standardUncertainty: levelOffsetM.standardUncertainty,
    },
  ]);
  return { value, standardUncertainty };
}

/**
 * How much water do systems hold that are joined into one body of water? The sum, uncorrelated (GUM 5.1.2). Litres.
 * Domain: at least one system; RangeError outside it.
 *
 * @example joinedVolume([{ value: 1000, standardUncertainty: 3 }, { value: 500, standardUncertainty: 4 }]) // => { value: 1500, standardUncertainty: 5 }
 */
export function joinedVolume(volumesL: readonly Measured[]): Measured {
  if (volumesL.length === 0) throw new RangeError("Joining needs at least one system.");
  const parts = volumesL.map(({ standardUncertainty }) => ({ sensitivity: 1, standardUncertainty }));
  return {
    value: volumesL.reduce((sum, each) => sum + each.value, 0),
    standardUncertainty: combineUncorrelated(parts),
  };
}

/**
 * Which systems share one body of water? Everything reachable over joins, in either direction, the start included,
 * ascending by id; a join is a pair of system ids.
 *
 * @example joinedSystems(1, [[1, 2], [3, 2], [4, 5]]) // => [1, 2, 3]
 */
export function joinedSystems(startId: number, joins: readonly (readonly [number, number])[]): number[] {
  const found = new Set([startId]);
  let grew = true;
  while (grew) {
    const before = found.size;
    for (const [one, other] of joins) {
      if (found.has(one)) found.add(other);
      if (found.has(other)) found.add(one);
    }
    grew = found.size > before;
  }
  return [...found].sort((a, b) => a - b);
}
