import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { reinstatePersonInput } from "../input";
import { getPerson } from "../people";
import { credential, person } from "../schema";

/** Lets a suspended person back in; somebody who never chose a password is invited again. */
export const reinstatePerson = defineCommand({
  verb: "reinstatePerson",
  permission: identityMay.managePeople,
  input: reinstatePersonInput,
  run(ctx, { personId }) {
    if (getPerson(ctx.db, personId).state !== "suspended")
      throw new Problem("conflict", "This person is not suspended.");
    const hasPassword = ctx.db.select().from(credential).where(eq(credential.personId, personId)).get();
    const state = hasPassword ? "active" : "invited";
    ctx.db.update(person).set({ state, suspendedReason: null }).where(eq(person.id, personId)).run();
    return {
      result: { personId, state },
      event: { kind: identityEvents.reinstated, subject: { type: "person", id: personId } },
    };
  },
});
