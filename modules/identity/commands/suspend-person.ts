import { and, eq, isNull } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { suspendPersonInput } from "../input";
import { getPerson } from "../people";
import { person, session } from "../schema";
import { mustLeaveAnAdministrator } from "./end-role";

/** Shuts a person out: the very next request of any of their sessions is refused. What they did stays. */
export const suspendPerson = defineCommand({
  verb: "suspendPerson",
  permission: identityMay.managePeople,
  input: suspendPersonInput,
  run(ctx, { personId, reason }) {
    const found = getPerson(ctx.db, personId);
    if (personId === ctx.actor.personId) throw new Problem("conflict", "You cannot suspend yourself.");
    if (found.state === "suspended") throw new Problem("conflict", "This person is suspended already.");
    mustLeaveAnAdministrator(ctx.db, personId);
    ctx.db
      .update(person)
      .set({ state: "suspended", suspendedReason: reason })
      .where(eq(person.id, personId))
      .run();
    ctx.db
      .update(session)
      .set({ endedAt: ctx.at })
      .where(and(eq(session.personId, personId), isNull(session.endedAt)))
      .run();
    return {
      result: { personId },
      event: { kind: identityEvents.suspended, subject: { type: "person", id: personId }, reason },
    };
  },
});
