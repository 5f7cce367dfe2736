import type { Orm } from "@/db/database";
import type { QueryContext } from "@/modules/audit";
import { ask, defineQuery } from "@/modules/audit";
import { listPersonNames } from "@/modules/identity";
import { systemsMay } from "../abilities";
import { volumeOfInput } from "../input";
import type { DeterminationRow, GeometrySnapshot, Measured, VolumeSheet } from "../model";
import { determinationsOf, getSystemById, joinsAt, levelsOf } from "../records";
import { disagreement } from "../rules/disagreement";
import { joinedSystems, joinedVolume, operatingVolume } from "../rules/operating-volume";
import { recordAt } from "../rules/record-at";
import type { volumeDetermination } from "../schema";
import { visibleSystem } from "./get-system";

type Stored = typeof volumeDetermination.$inferSelect;
type Names = ReadonlyMap<number, string>;

/**
 * What a system holds: its volume of record at a moment (now, unless told), what it holds at its present level, the
 * systems it is joined with, and every determination with what contradicts the volume of record.
 * @throws Problem `not-found`
 */
export const volumeOf = defineQuery({
  name: "volumeOf",
  permission: systemsMay.read,
  input: volumeOfInput,
  run(ctx, { code, at = ctx.at }): VolumeSheet {
    const system = visibleSystem(ctx, code, at);
    const names = namesById(ctx);
    const stored = determinationsOf(ctx.db, system.id);
    const record = recordAt(stored, at);
    const rows = stored.map((row) => toRow(row, system.code, stored, record, names)).reverse();
    const level = levelsOf(ctx.db, system.id).findLast((each) => each.setAt <= at) ?? null;
    const today = operatingOf(ctx.db, system.id, at);
    return {
      system,
      record: rows.find((row) => row.isOfRecord) ?? null,
      level: level && { ...level, setBy: nameOf(names, level.setBy) },
      operating: today.volume,
      operatingSays: today.says,
      ...joinedOf(ctx, system.id, today.volume, at),
      determinations: rows,
    };
  },
});

const namesById = (ctx: QueryContext): Names =>
  new Map(ask(ctx, listPersonNames, {}).map(({ id, name }) => [id, name]));
const nameOf = (names: Names, id: number | null): string | null =>
  id === null ? null : (names.get(id) ?? `person ${id}`);

const quantityOf = (row: Stored): Measured => ({
  value: row.volumeL,
  standardUncertainty: row.standardUncertaintyL,
});

/** A volume is held against the volume of record; the one of record against the one that it took the place of. */
function toRow(
  row: Stored,
  systemCode: string,
  all: Stored[],
  record: Stored | null,
  names: Names,
): DeterminationRow {
  const isOfRecord = row.id === record?.id;
  const before =
    record &&
    recordAt(
      all.filter((each) => each.id !== record.id),
      record.effectiveFromAt,
    );
  const against = isOfRecord ? before : row.status === "proposed" ? record : null;
  return {
    id: row.id,
    systemId: row.systemId,
    systemCode,
    method: row.method,
    volumeL: row.volumeL,
    standardUncertaintyL: row.standardUncertaintyL,
    surfaceAreaM2: row.surfaceAreaM2,
    correlation: row.correlation,
    geometry: row.components === null ? null : (JSON.parse(row.components) as GeometrySnapshot),
    note: row.note,
    status: row.status,
    proposedById: row.proposedBy,
    proposedBy: nameOf(names, row.proposedBy) ?? "",
    proposedAt: row.proposedAt,
    effectiveFromAt: row.effectiveFromAt,
    decidedBy: nameOf(names, row.decidedBy),
    decidedAt: row.decidedAt,
    decisionReason: row.decisionReason,
    isOfRecord,
    disagreement: against ? disagreement(quantityOf(row), quantityOf(against)).sentence : null,
  };
}

/** What one system holds at a moment, or why that cannot be told. */
export function operatingOf(
  db: Orm,
  systemId: number,
  at: number,
): { volume: Measured | null; says: string | null } {
  const level = levelsOf(db, systemId).findLast((each) => each.setAt <= at);
  if (level?.isDrained) return { volume: { value: 0, standardUncertainty: 0 }, says: null };
  const record = recordAt(determinationsOf(db, systemId), at);
  if (!record)
    return { volume: null, says: "No volume has been approved yet: propose one, and a lead approves it." };
  const surfaceM2 =
    record.surfaceAreaM2 === null
      ? null
      : { value: record.surfaceAreaM2, standardUncertainty: record.surfaceAreaUncertaintyM2 ?? 0 };
  const levelOffsetM = {
    value: level?.levelOffsetM ?? 0,
    standardUncertainty: level?.levelOffsetUncertaintyM ?? 0,
  };
  try {
    return {
      volume: operatingVolume(quantityOf(record), surfaceM2, { levelOffsetM, isDrained: false }),
      says: null,
    };
  } catch (error) {
    if (error instanceof RangeError) return { volume: null, says: error.message };
    throw error;
  }
}

function joinedOf(ctx: QueryContext, systemId: number, own: Measured | null, at: number) {
  const pairs = joinsAt(ctx.db, at).map((each) => [each.oneSystemId, each.otherSystemId] as const);
  const partners = joinedSystems(systemId, pairs)
    .filter((id) => id !== systemId)
    .map((id) => ({ ...getSystemById(ctx.db, id), operating: operatingOf(ctx.db, id, at).volume }));
  const seen = partners.filter((each) => ctx.areaIds === null || ctx.areaIds.includes(each.areaId));
  const volumes = [own, ...partners.map((each) => each.operating)];
  const isWhole = partners.length > 0 && volumes.every((volume) => volume !== null);
  return {
    joinedWith: seen.map(({ id, code, name, operating }) => ({ id, code, name, operating })),
    joinedElsewhere: partners.length - seen.length,
    joinedTotal: isWhole ? joinedVolume(volumes.filter((volume) => volume !== null)) : null,
  };
}
