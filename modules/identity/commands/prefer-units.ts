import { eq } from "drizzle-orm";
import { invariant } from "@/lib/invariant";
import { invalidField } from "@/lib/problem";
import { findUnit } from "@/lib/units";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { preferUnitsInput } from "../input";
import { person } from "../schema";

/** Chooses the units in which a person likes to read and type, by dimension. */
export const preferUnits = defineCommand({
  verb: "preferUnits",
  permission: identityMay.ownAccount,
  input: preferUnitsInput,
  run(ctx, { units }) {
    invariant(ctx.actor.personId !== null, "a person has preferences");
    for (const [dimension, code] of Object.entries(units)) {
      if (findUnit(code)?.dimension === dimension) continue;
      throw invalidField(`/units/${dimension}`, "unknown-unit", `“${code}” is not a unit of ${dimension}.`);
    }
    ctx.db
      .update(person)
      .set({ preferredUnits: JSON.stringify(units) })
      .where(eq(person.id, ctx.actor.personId))
      .run();
    return {
      result: { units },
      event: {
        kind: identityEvents.unitsPreferred,
        subject: { type: "person", id: ctx.actor.personId },
        payload: { units },
      },
    };
  },
});
