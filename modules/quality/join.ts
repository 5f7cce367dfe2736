import { eq } from "drizzle-orm";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import type { CommandContext } from "@/modules/audit";
import { addExplanation, readingInForce } from "@/modules/measurements";
import type { Incident } from "./records";
import { getIncidentRow } from "./records";
import { incidentReading } from "./schema";

/** Puts a reading under an incident and explains it on its day sheet. @throws Problem `conflict` */
export function joinToIncident(ctx: CommandContext, of: Incident, readingId: number): void {
  const personId = ctx.actor.personId;
  invariant(personId !== null, "a person joins a reading");
  const known = ctx.db.select().from(incidentReading).where(eq(incidentReading.readingId, readingId)).get();
  if (known) {
    const { code } = getIncidentRow(ctx.db, known.incidentId);
    throw new Problem("conflict", `This reading has been joined to incident ${code} already.`);
  }
  ctx.db
    .insert(incidentReading)
    .values({ incidentId: of.id, readingId, joinedBy: personId, joinedAt: ctx.at })
    .run();
  addExplanation(ctx, { readingId, text: `incident ${of.code}: ${of.title}` });
}

/** The newest judgement of a reading in force. */
export function statusOf(ctx: CommandContext, readingId: number) {
  const row = ctx.db.select().from(readingInForce).where(eq(readingInForce.id, readingId)).get();
  invariant(row, "the reading is in force");
  return row;
}
