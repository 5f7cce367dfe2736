import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { getInForce } from "@/modules/measurements";
import { STATUS_WORDS } from "@/modules/measurements/model";
import { getPoint } from "@/modules/systems";
import { qualityMay } from "../abilities";
import { qualityEvents } from "../events";
import { joinReadingInput } from "../input";
import { joinToIncident, statusOf } from "../join";
import { isOff } from "../model";
import { areaOfIncident, getUnclosed } from "../records";
import { mustBeSameTrouble } from "../rules/same-trouble";
import { incident } from "../schema";

/** Joins a later reading of the same trouble; it is explained by that. An incident that was rechecked is open again. */
export const joinReading = defineCommand({
  verb: "joinReading",
  permission: qualityMay.handle,
  input: joinReadingInput,
  areas: areaOfIncident,
  run(ctx, { incidentId, readingId }) {
    const of = getUnclosed(ctx.db, incidentId);
    const row = getInForce(ctx.db, readingId);
    mustBeSameTrouble(of, { ...row, systemId: getPoint(ctx.db, row.pointId).systemId });
    const { status } = statusOf(ctx, readingId);
    if (!isOff(status)) {
      throw new Problem(
        "conflict",
        `This reading is not out of tolerance (${STATUS_WORDS[status]}). Record it as the recheck of ${of.code} instead.`,
      );
    }
    joinToIncident(ctx, of, readingId);
    const beganAt = Math.min(of.beganAt, row.takenAt);
    ctx.db.update(incident).set({ state: "open", beganAt }).where(eq(incident.id, incidentId)).run();
    return {
      result: { incidentId, code: of.code },
      event: {
        kind: qualityEvents.readingJoined,
        subject: { type: "incident", id: incidentId },
        payload: { readingId },
      },
    };
  },
});
