import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { mustBeAnother } from "@/modules/identity";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { approveVolumeInput } from "../input";
import { determinationsOf, getDetermination } from "../records";
import { disagreement } from "../rules/disagreement";
import { recordAt } from "../rules/record-at";
import { volumeDetermination } from "../schema";
import { mustBeOpen } from "./must-be-open";

/**
 * Makes a proposed volume the volume of record from the moment it names. Not by the person who proposed it. One that
 * contradicts the volume of record is first shown to the approver, who says that it is to be taken all the same.
 */
export const approveVolume = defineCommand({
  verb: "approveVolume",
  permission: systemsMay.approveVolume,
  input: approveVolumeInput,
  run({ db, actor, at }, { determinationId, reason, acceptsDisagreement }) {
    const proposed = getDetermination(db, determinationId);
    mustBeAnother(actor.personId, proposed.proposedBy, "volume");
    mustBeOpen(proposed);
    const before = recordAt(determinationsOf(db, proposed.systemId), proposed.effectiveFromAt);
    const verdict = before && disagreement(quantityOf(proposed), quantityOf(before));
    if (verdict?.sentence && !acceptsDisagreement) throw new Problem("needs-confirmation", verdict.sentence);
    db.update(volumeDetermination)
      .set({ status: "approved", decidedBy: actor.personId, decidedAt: at, decisionReason: reason || null })
      .where(eq(volumeDetermination.id, determinationId))
      .run();
    return {
      result: { id: determinationId, disagreement: verdict?.sentence ?? null },
      event: {
        kind: systemsEvents.volumeApproved,
        subject: { type: "volume", id: determinationId },
        payload: {
          systemId: proposed.systemId,
          effectiveFromAt: proposed.effectiveFromAt,
          ...(verdict?.disagrees ? { disagreesWith: before?.id } : {}),
        },
        reason: reason || null,
      },
    };
  },
});

const quantityOf = (row: { volumeL: number; standardUncertaintyL: number }) => ({
  value: row.volumeL,
  standardUncertainty: row.standardUncertaintyL,
});
