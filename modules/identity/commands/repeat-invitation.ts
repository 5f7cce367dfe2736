import { z } from "zod";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { sendOneTimeLink } from "../links";
import { getPerson } from "../people";

/** Sends a new invitation to somebody who has not come in yet; the old link stops working. */
export const repeatInvitation = defineCommand({
  verb: "repeatInvitation",
  permission: identityMay.managePeople,
  input: z.strictObject({ personId: z.coerce.number().int().positive() }),
  run(ctx, { personId }) {
    const invited = getPerson(ctx.db, personId);
    if (invited.state !== "invited") throw new Problem("conflict", "This person has come in already.");
    sendOneTimeLink(ctx, invited, "invitation");
    return {
      result: { personId },
      event: { kind: identityEvents.inviteRepeated, subject: { type: "person", id: personId } },
    };
  },
});
