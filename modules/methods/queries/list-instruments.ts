import { asc, desc, eq, ne, type SQL, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { settings } from "@/lib/env";
import { notFound } from "@/lib/problem";
import { epochToLocal } from "@/lib/zone";
import { defineQuery } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { instrumentByCodeInput, listInstrumentsInput } from "../input";
import type { InstrumentCheckRow, InstrumentDetail, InstrumentRow } from "../model";
import { checkDue } from "../rules/check-due";
import { instrument, instrumentCheck, parameter } from "../schema";

/** The checks of instruments, newest first. */
function checksOf(db: Orm, where: SQL | undefined): (InstrumentCheckRow & { instrumentId: number })[] {
  return db
    .select({
      id: instrumentCheck.id,
      instrumentId: instrumentCheck.instrumentId,
      parameterId: instrumentCheck.parameterId,
      parameterName: parameter.name,
      checkedAt: instrumentCheck.checkedAt,
      checkedBy: instrumentCheck.checkedBy,
      standard: instrumentCheck.standard,
      standardValue: instrumentCheck.standardValue,
      asFound: instrumentCheck.asFound,
      asLeft: instrumentCheck.asLeft,
      unit: instrumentCheck.unit,
      verdict: instrumentCheck.verdict,
      note: instrumentCheck.note,
      dueOn: instrumentCheck.dueOn,
    })
    .from(instrumentCheck)
    .leftJoin(parameter, eq(parameter.id, instrumentCheck.parameterId))
    .where(where)
    .orderBy(desc(instrumentCheck.checkedAt), desc(instrumentCheck.id))
    .all();
}

/** The newest check of each instrument. */
const isNewest = sql`${instrumentCheck.id} = (
  select newest.id from methods_instrument_check newest
  where newest.instrument_id = ${instrumentCheck.instrumentId}
  order by newest.checked_at desc, newest.id desc limit 1)`;

function toRow(
  { id, ...row }: typeof instrument.$inferSelect,
  lastCheck: InstrumentCheckRow | null,
  at: number,
): InstrumentRow {
  const zone = settings().STILLWELL_ZONE;
  const last = lastCheck && { on: epochToLocal(lastCheck.checkedAt, zone).on, verdict: lastCheck.verdict };
  const due = checkDue({ checkEveryDays: row.checkEveryDays, last }, epochToLocal(at, zone).on);
  return { id, ...row, lastCheck, due: row.state === "retired" ? { ...due, isOverdue: false } : due };
}

/** The instruments by code, each with its newest check and when the next is due; retired ones only when asked for. */
export const listInstruments = defineQuery({
  name: "listInstruments",
  permission: methodsMay.read,
  input: listInstrumentsInput,
  run({ db, at }, { includeRetired }): InstrumentRow[] {
    const newest = new Map(checksOf(db, isNewest).map((check) => [check.instrumentId, check]));
    return db
      .select()
      .from(instrument)
      .where(includeRetired ? undefined : ne(instrument.state, "retired"))
      .orderBy(asc(instrument.code))
      .all()
      .map((row) => toRow(row, newest.get(row.id) ?? null, at));
  },
});

/** One instrument with all its checks, newest first. @throws Problem `not-found` */
export const getInstrument = defineQuery({
  name: "getInstrument",
  permission: methodsMay.read,
  input: instrumentByCodeInput,
  run({ db, at }, { code }): InstrumentDetail {
    const row = db
      .select()
      .from(instrument)
      .where(eq(sql`lower(${instrument.code})`, code.toLowerCase()))
      .get();
    if (!row) throw notFound(`instrument ${code}`);
    const checks = checksOf(db, eq(instrumentCheck.instrumentId, row.id));
    return { ...toRow(row, checks[0] ?? null, at), checks };
  },
});
