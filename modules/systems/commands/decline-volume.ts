import { eq } from "drizzle-orm";
import { defineCommand } from "@/modules/audit";
import { mustBeAnother } from "@/modules/identity";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { declineVolumeInput } from "../input";
import { getDetermination } from "../records";
import { volumeDetermination } from "../schema";
import { mustBeOpen } from "./must-be-open";

/** Sets a proposed volume aside, with the reason. It stays to be seen. */
export const declineVolume = defineCommand({
  verb: "declineVolume",
  permission: systemsMay.approveVolume,
  input: declineVolumeInput,
  run({ db, actor, at }, { determinationId, reason }) {
    const proposed = getDetermination(db, determinationId);
    mustBeAnother(actor.personId, proposed.proposedBy, "volume");
    mustBeOpen(proposed);
    db.update(volumeDetermination)
      .set({ status: "declined", decidedBy: actor.personId, decidedAt: at, decisionReason: reason })
      .where(eq(volumeDetermination.id, determinationId))
      .run();
    return {
      result: { id: determinationId },
      event: {
        kind: systemsEvents.volumeDeclined,
        subject: { type: "volume", id: determinationId },
        payload: { systemId: proposed.systemId },
        reason,
      },
    };
  },
});
