import { eq } from "drizzle-orm";
import { invariant } from "@/lib/invariant";
import { invalidField, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { STATUS_WORDS } from "@/modules/measurements/model";
import { qualityMay } from "../abilities";
import { qualityEvents } from "../events";
import { closeIncidentInput } from "../input";
import { isOff } from "../model";
import { getUnclosed, newestReading, peopleWhoActed } from "../records";
import { incident } from "../schema";

/**
 * A lead's last word on an incident. Refused while the newest reading there is off (unless a reason says why), and where
 * nobody but the closing lead has acted on it.
 */
export const closeIncident = defineCommand({
  verb: "closeIncident",
  permission: qualityMay.close,
  input: closeIncidentInput,
  run(ctx, { incidentId, closureText, stillOffReason }) {
    const personId = ctx.actor.personId;
    invariant(personId !== null, "a person closes an incident");
    const of = getUnclosed(ctx.db, incidentId);
    const others = [...peopleWhoActed(ctx.db, of)].filter((id) => id !== personId);
    if (others.length === 0) {
      throw new Problem(
        "own-work",
        `Only you have acted on ${of.code}. Another person must recheck it or write what they saw, or another lead must close it.`,
      );
    }
    const newest =
      of.pointId === null || of.parameterId === null
        ? null
        : newestReading(ctx.db, of.pointId, of.parameterId);
    const isStillOff = newest !== null && isOff(newest.status);
    if (isStillOff && stillOffReason.length < 10) {
      throw invalidField(
        "/stillOffReason",
        "still-off",
        `The newest reading is still ${STATUS_WORDS[newest.status]}. Recheck it first, or say why it can be closed all the same.`,
      );
    }
    const keptReason = isStillOff ? stillOffReason : null;
    ctx.db
      .update(incident)
      .set({
        state: "closed",
        closedAt: ctx.at,
        closedBy: personId,
        closureText,
        stillOffReason: keptReason,
        recheckDueAt: null,
      })
      .where(eq(incident.id, incidentId))
      .run();
    return {
      result: { incidentId, code: of.code },
      event: {
        kind: qualityEvents.closed,
        subject: { type: "incident", id: incidentId },
        payload: { wasStillOff: isStillOff },
        reason: keptReason,
      },
    };
  },
});
