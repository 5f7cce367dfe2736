/** Area of a part-full circle and how it changes: square metres, metres, metres. */
export type SegmentArea = { areaM2: number; perDepthM: number; perDiameterM: number };

/**
 * How much of a level circle's area lies under a depth of water? For the cross-section of a lying cylinder with flat
 * ends; not for dished ends.
 *
 * Formula: A = r² · acos((r − h)/r) − (r − h) · √(2rh − h²); ∂A/∂h is the chord 2√(h(d − h)); ∂A/∂d follows from A
 * being homogeneous of degree 2 in (d, h): d·∂A/∂d + h·∂A/∂h = 2A (Euler).
 * Units: metres, square metres. Domain: d > 0, 0 ≤ h ≤ d; RangeError outside it.
 * Source: circular segment, Bronshtein & Semendyayev, Handbook of Mathematics, plane geometry (circle).
 * Checked: half, full and 60° segments in tests/published/volume-lying-cylinder.test.ts.
 *
 * @example circularSegment(2, 1).areaM2 // => 1.5707963267948966
 */
export function circularSegment(diameterM: number, depthM: number): SegmentArea {
  if (!(diameterM > 0)) throw new RangeError("The diameter must be more than 0 m.");
  if (!(depthM >= 0 && depthM <= diameterM)) {
    throw new RangeError("The water's depth must lie between 0 m and the height of the tank.");
  }
  const radiusM = diameterM / 2;
  const belowCentreM = radiusM - depthM;
  const chordM = 2 * Math.sqrt(depthM * (diameterM - depthM));
  const areaM2 = Math.max(0, radiusM ** 2 * Math.acos(belowCentreM / radiusM) - belowCentreM * (chordM / 2));
  return { areaM2, perDepthM: chordM, perDiameterM: (2 * areaM2 - depthM * chordM) / diameterM };
}
