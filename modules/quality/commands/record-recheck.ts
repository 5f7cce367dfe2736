import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { getInForce } from "@/modules/measurements";
import { getPoint } from "@/modules/systems";
import { qualityMay } from "../abilities";
import { qualityEvents } from "../events";
import { recordRecheckInput } from "../input";
import { joinToIncident, statusOf } from "../join";
import { type IncidentState, isOff } from "../model";
import { areaOfIncident, getUnclosed } from "../records";
import { mustBeSameTrouble } from "../rules/same-trouble";
import { incident, incidentReading } from "../schema";

/**
 * Names the reading that shows whether the action worked. Within: the incident waits for a lead to close it. Off: the reading
 * joins, and the incident stays open. Anything between (watch, cannot be judged): it stays open.
 */
export const recordRecheck = defineCommand({
  verb: "recordRecheck",
  permission: qualityMay.handle,
  input: recordRecheckInput,
  areas: areaOfIncident,
  run(ctx, { incidentId, readingId }) {
    const of = getUnclosed(ctx.db, incidentId);
    const row = getInForce(ctx.db, readingId);
    mustBeSameTrouble(of, { ...row, systemId: getPoint(ctx.db, row.pointId).systemId });
    if (row.takenAt <= of.beganAt) {
      throw new Problem(
        "conflict",
        "A recheck is a reading taken after the trouble began; this one is older.",
      );
    }
    const { status } = statusOf(ctx, readingId);
    const state: IncidentState = status === "within" ? "rechecked" : "open";
    const isJoined = ctx.db
      .select({ id: incidentReading.id })
      .from(incidentReading)
      .where(eq(incidentReading.readingId, readingId))
      .get();
    if (isOff(status) && !isJoined) joinToIncident(ctx, of, readingId);
    ctx.db
      .update(incident)
      .set({
        state,
        recheckReadingId: readingId,
        recheckDueAt: state === "rechecked" ? null : of.recheckDueAt,
      })
      .where(eq(incident.id, incidentId))
      .run();
    return {
      result: { incidentId, state, status },
      event: {
        kind: qualityEvents.rechecked,
        subject: { type: "incident", id: incidentId },
        payload: { readingId, status },
      },
    };
  },
});
