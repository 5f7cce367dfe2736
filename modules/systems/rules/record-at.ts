import type { DeterminationStatus } from "../model";

type Candidate = {
  id: number;
  status: DeterminationStatus;
  effectiveFromAt: number;
  decidedAt: number | null;
};

/**
 * Which determination is the volume of record at a moment? The approved one that took effect last, at or before it; of
 * two that took effect together, the one approved later. Null where none had taken effect.
 *
 * @example recordAt([{ id: 1, status: "approved", effectiveFromAt: 10, decidedAt: 12 }], 9) // => null
 */
export function recordAt<D extends Candidate>(determinations: readonly D[], at: number): D | null {
  const inForce = determinations.filter((one) => one.status === "approved" && one.effectiveFromAt <= at);
  const [latest] = inForce.toSorted(
    (a, b) => b.effectiveFromAt - a.effectiveFromAt || (b.decidedAt ?? 0) - (a.decidedAt ?? 0) || b.id - a.id,
  );
  return latest ?? null;
}
