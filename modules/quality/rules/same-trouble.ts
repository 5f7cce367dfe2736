import { Problem } from "@/lib/problem";

type Trouble = { code: string; systemId: number; pointId: number | null; parameterId: number | null };
type Where = { systemId: number; pointId: number; parameterId: number };

/**
 * A reading belongs to an incident when it is of the same point and parameter; where the incident is about a system as a
 * whole, when it is of that system. @throws Problem `conflict`
 */
export function mustBeSameTrouble(of: Trouble, reading: Where): void {
  if (of.systemId !== reading.systemId) {
    throw new Problem("conflict", `This reading is of another system than incident ${of.code}.`);
  }
  if (of.pointId === null) return;
  if (of.pointId !== reading.pointId || of.parameterId !== reading.parameterId) {
    throw new Problem("conflict", `This reading is of another point or parameter than incident ${of.code}.`);
  }
}
