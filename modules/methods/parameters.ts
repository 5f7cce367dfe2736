import { asc, eq, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { notFound } from "@/lib/problem";
import type { FacilityParameter } from "./model";
import { parameter } from "./schema";

type Row = typeof parameter.$inferSelect;

/** A row as the rules and forms know it. */
export function toFacilityParameter(row: Row): FacilityParameter {
  const { plausibleLow, plausibleHigh, retiredAt, retiredReason: _reason, ...rest } = row;
  return { ...rest, plausible: { low: plausibleLow, high: plausibleHigh }, isRetired: retiredAt !== null };
}

/** @throws Problem `not-found` */
export function getParameter(db: Orm, parameterId: number): FacilityParameter {
  const row = db.select().from(parameter).where(eq(parameter.id, parameterId)).get();
  if (!row) throw notFound("such parameter");
  return toFacilityParameter(row);
}

/** A parameter by its code, in any case of letters; null where there is none. */
export function findParameterByCode(db: Orm, code: string): FacilityParameter | null {
  const row = db.select().from(parameter).where(sql`lower(${parameter.code}) = ${code.toLowerCase()}`).get();
  return row ? toFacilityParameter(row) : null;
}

/** Every parameter, in the order of groups and names. */
export function allParameters(db: Orm): FacilityParameter[] {
  return db
    .select()
    .from(parameter)
    .orderBy(asc(parameter.group), asc(parameter.name))
    .all()
    .map(toFacilityParameter);
}
