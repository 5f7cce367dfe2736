import { eq } from "drizzle-orm";
import type { z } from "zod";
import { settings } from "@/lib/env";
import { invariant } from "@/lib/invariant";
import { invalidField, Problem } from "@/lib/problem";
import { epochToLocal } from "@/lib/zone";
import { type CommandContext, defineCommand } from "@/modules/audit";
import { findActivePerson } from "@/modules/identity";
import { getInForce, reading } from "@/modules/measurements";
import { STATUS_WORDS } from "@/modules/measurements/model";
import { getParameter } from "@/modules/methods";
import { getPoint, getSystemById } from "@/modules/systems";
import { qualityMay } from "../abilities";
import { qualityEvents } from "../events";
import { openIncidentInput } from "../input";
import { joinToIncident, statusOf } from "../join";
import { isOff } from "../model";
import { nextCode, unclosedAt } from "../records";
import { incident, incidentNote } from "../schema";

type Input = z.output<typeof openIncidentInput>;
type Place = { systemId: number; pointId: number | null; parameterId: number | null; beganAt: number };

function placeOfReading(ctx: CommandContext, readingId: number): Place {
  const row = getInForce(ctx.db, readingId);
  const { status } = statusOf(ctx, readingId);
  if (!isOff(status)) {
    throw new Problem(
      "conflict",
      `This reading is not out of tolerance (${STATUS_WORDS[status]}). Open an incident for the system by hand if something else is wrong.`,
    );
  }
  const { systemId } = getPoint(ctx.db, row.pointId);
  return { systemId, pointId: row.pointId, parameterId: row.parameterId, beganAt: row.takenAt };
}

function placeByHand(ctx: CommandContext, input: Input): Place {
  invariant(input.systemId !== undefined, "the schema asks for a system");
  const { id: systemId } = getSystemById(ctx.db, input.systemId);
  const { pointId = null, parameterId = null } = input;
  if (pointId !== null && getPoint(ctx.db, pointId).systemId !== systemId) {
    throw invalidField("/pointId", "other-system", "This point belongs to another system.");
  }
  if (parameterId !== null) getParameter(ctx.db, parameterId);
  return { systemId, pointId, parameterId, beganAt: ctx.at };
}

function mustBeNew(ctx: CommandContext, { pointId, parameterId }: Place): void {
  if (pointId === null || parameterId === null) return;
  const known = unclosedAt(ctx.db, pointId, parameterId);
  if (!known) return;
  throw new Problem("conflict", `Incident ${known.code} is about this already. Join the reading to it.`);
}

/** Takes up a trouble: from a reading that is off (which is joined to it), or by hand for a system. */
export const openIncident = defineCommand({
  verb: "openIncident",
  permission: qualityMay.handle,
  input: openIncidentInput,
  areas(ctx, { readingId, systemId }) {
    if (readingId === undefined)
      return systemId === undefined ? [] : [getSystemById(ctx.db, systemId).areaId];
    const row = ctx.db
      .select({ pointId: reading.pointId })
      .from(reading)
      .where(eq(reading.id, readingId))
      .get();
    return row ? [getPoint(ctx.db, row.pointId).areaId] : [];
  },
  run(ctx, input) {
    const personId = ctx.actor.personId;
    invariant(personId !== null, "a person opens an incident");
    const { readingId, title, note, recheckDueAt = null, ownerId = personId } = input;
    const place = readingId === undefined ? placeByHand(ctx, input) : placeOfReading(ctx, readingId);
    mustBeNew(ctx, place);
    if (!findActivePerson(ctx.db, ownerId)) {
      throw invalidField("/ownerId", "unknown-person", "There is no such person here any more.");
    }
    if (recheckDueAt !== null && recheckDueAt <= ctx.at) {
      throw invalidField("/recheckDueAt", "past", "The recheck must lie ahead.");
    }
    const year = Number(epochToLocal(ctx.at, settings().STILLWELL_ZONE).on.slice(0, 4));
    const opened = ctx.db
      .insert(incident)
      .values({
        ...place,
        code: nextCode(ctx.db, year),
        title,
        state: "open",
        ownerId,
        openedAt: ctx.at,
        openedBy: personId,
        recheckDueAt,
      })
      .returning()
      .get();
    if (readingId !== undefined) joinToIncident(ctx, opened, readingId);
    if (note !== "") {
      ctx.db
        .insert(incidentNote)
        .values({ incidentId: opened.id, text: note, notedBy: personId, notedAt: ctx.at })
        .run();
    }
    return {
      result: { incidentId: opened.id, code: opened.code },
      event: {
        kind: qualityEvents.opened,
        subject: { type: "incident", id: opened.id },
        payload: { ...place, readingId: readingId ?? null },
      },
    };
  },
});
