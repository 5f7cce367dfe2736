import { and, eq, ne, sql } from "drizzle-orm";
import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { editPersonInput } from "../input";
import { getPerson } from "../people";
import { person } from "../schema";

/** Corrects a name or an address. */
export const editPerson = defineCommand({
  verb: "editPerson",
  permission: identityMay.managePeople,
  input: editPersonInput,
  run(ctx, { personId, name, email }) {
    getPerson(ctx.db, personId);
    const taken = ctx.db
      .select({ id: person.id })
      .from(person)
      .where(and(sql`lower(${person.email}) = lower(${email})`, ne(person.id, personId)))
      .get();
    if (taken) throw invalidField("/email", "taken", "Somebody else has this e-mail address.");
    ctx.db.update(person).set({ name, email }).where(eq(person.id, personId)).run();
    return {
      result: { personId },
      event: { kind: identityEvents.edited, subject: { type: "person", id: personId } },
    };
  },
});
