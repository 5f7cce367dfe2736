import { requireFinite, requirePositive } from "./values";

export type ZClass = "acceptable" | "warning" | "action";
export type EnClass = "satisfactory" | "unsatisfactory";

/**
 * z = (result - assigned) / sigma for proficiency assessment.
 *
 * Source: ISO 13528:2015, 9.4. Checked: NIST Dataplot reference output, gear data.
 * @example zScore({ result: 12, assigned: 10, sigma: 1 }) // => 2
 */
export function zScore(input: {
  readonly result: number;
  readonly assigned: number;
  readonly sigma: number;
}): number {
  const off = requireFinite(input.result, "result") - requireFinite(input.assigned, "assigned");
  return off / requirePositive(input.sigma, "sigma");
}

/**
 * zeta = (result - assigned) / sqrt(u^2 + u assigned^2), with standard uncertainties.
 *
 * Source: ISO 13528:2015, 9.6. Checked: NIST Dataplot reference output, gear data.
 * @example zetaScore({ result: 15, assigned: 10, u: 3, uAssigned: 4 }) // => 1
 */
export function zetaScore(input: {
  readonly result: number;
  readonly assigned: number;
  readonly u: number;
  readonly uAssigned: number;
}): number {
  const both = requirePositive(Math.hypot(input.u, input.uAssigned), "The combined uncertainty");
  return (requireFinite(input.result, "result") - requireFinite(input.assigned, "assigned")) / both;
}

/**
 * En = (result - assigned) / sqrt(U^2 + U assigned^2), with expanded uncertainties (k = 2).
 *
 * Source: ISO 13528:2015, 9.7; ISO/IEC 17043. Checked: NIST Dataplot reference output, gear data.
 * @example enScore({ result: 15, assigned: 10, expanded: 3, expandedAssigned: 4 }) // => 1
 */
export function enScore(input: {
  readonly result: number;
  readonly assigned: number;
  readonly expanded: number;
  readonly expandedAssigned: number;
}): number {
  return zetaScore({ ...input, u: input.expanded, uAssigned: input.expandedAssigned });
}

/**
 * What a z or zeta score says: |z| up to 2 acceptable (2 included), from 3 action (3 included), between them warning.
 *
 * Source: ISO 13528:2015, 9.4.2 (equality from memory).
 * @example zClass(2.5) // => "warning"
 */
export function zClass(z: number): ZClass {
  const size = Math.abs(requireFinite(z, "z"));
  if (size >= 3 - 1e-9) return "action";
  return size <= 2 + 1e-9 ? "acceptable" : "warning";
}

/**
 * What an En score says: |En| up to 1 (included) satisfactory.
 *
 * Source: ISO/IEC 17043 (equality from memory).
 * @example enClass(-1) // => "satisfactory"
 */
export function enClass(en: number): EnClass {
  return Math.abs(requireFinite(en, "En")) <= 1 + 1e-9 ? "satisfactory" : "unsatisfactory";
}
