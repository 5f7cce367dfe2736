import type { Orm } from "@/db/database";
import { notFound } from "@/lib/problem";
import { processSingleton } from "@/lib/process-singleton";
import { type Actor, may, type Permission, visibleAreas } from "@/modules/access";
import { auditMay } from "./abilities";
import { newestRow } from "./lineage";

/** Who may read the history of a table's records: whoever may see the records themselves. */
export type RecordGate = {
  /** The permission to see such records. */
  may: Permission;
  /** How a record leads to its area: a column and the table it points to; "itself" where the record is an area; left out
   * where records belong to no area. */
  area?: "itself" | readonly [column: string, table: string];
};
export type RecordGates = Readonly<Record<string, RecordGate>>;

const registry = processSingleton("record-gates", () => ({ gates: {} as RecordGates }));

/** Says who may read which record's history (the table is app/_server/record-gates.ts). A table without a gate is open only
 * to those who read the whole history. */
export function useRecordGates(gates: RecordGates): void {
  registry.gates = gates;
}

const MOST_STEPS = 6;

/** The area of a record, by following its gates; null where a step leads nowhere. */
function areaOf(db: Orm, table: string, key: string): number | null {
  let at = { table, key };
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const path = registry.gates[at.table]?.area;
    if (path === undefined) return null;
    if (path === "itself") return Number(at.key);
    const row = newestRow(db, at.table, at.key);
    const next = row === null ? null : (JSON.parse(row) as Record<string, unknown>)[path[0]];
    if (next === null || next === undefined) return null;
    at = { table: path[1], key: String(next) };
  }
  return null;
}

/**
 * Lets through whoever may see the record itself; its history tells no more.
 * @throws Problem `not-found`, so that nobody learns which records exist
 */
export function mustSeeRecord(ctx: { db: Orm; actor: Actor }, table: string, key: string): void {
  if (may(ctx.actor, auditMay.readHistory)) return;
  const gate = registry.gates[table];
  if (!gate || !may(ctx.actor, gate.may)) throw notFound("such record");
  const areas = visibleAreas(ctx.actor, gate.may);
  if (areas === null || gate.area === undefined) return;
  const area = areaOf(ctx.db, table, key);
  if (area === null || !areas.includes(area)) throw notFound("such record");
}
