import { eq } from "drizzle-orm";
import { invariant } from "@/lib/invariant";
import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { findActivePerson } from "@/modules/identity";
import { qualityMay } from "../abilities";
import { qualityEvents } from "../events";
import { addNoteInput, setOwnerInput, setRecheckInput } from "../input";
import { areaOfIncident, getUnclosed } from "../records";
import { incident, incidentNote } from "../schema";

const subjectOf = (incidentId: number) => ({ type: "incident", id: incidentId });

/** Writes down what was seen or done. */
export const addIncidentNote = defineCommand({
  verb: "addIncidentNote",
  permission: qualityMay.handle,
  input: addNoteInput,
  areas: areaOfIncident,
  run(ctx, { incidentId, text }) {
    const personId = ctx.actor.personId;
    invariant(personId !== null, "a person writes a note");
    getUnclosed(ctx.db, incidentId);
    const added = ctx.db
      .insert(incidentNote)
      .values({ incidentId, text, notedBy: personId, notedAt: ctx.at })
      .returning({ id: incidentNote.id })
      .get();
    return {
      result: { noteId: added.id },
      event: { kind: qualityEvents.noted, subject: subjectOf(incidentId), payload: { noteId: added.id } },
    };
  },
});

/** Says who is waited for. */
export const setOwner = defineCommand({
  verb: "setOwner",
  permission: qualityMay.handle,
  input: setOwnerInput,
  areas: areaOfIncident,
  run(ctx, { incidentId, ownerId }) {
    getUnclosed(ctx.db, incidentId);
    if (!findActivePerson(ctx.db, ownerId)) {
      throw invalidField("/ownerId", "unknown-person", "There is no such person here any more.");
    }
    ctx.db.update(incident).set({ ownerId }).where(eq(incident.id, incidentId)).run();
    return {
      result: { incidentId },
      event: { kind: qualityEvents.ownerSet, subject: subjectOf(incidentId), payload: { ownerId } },
    };
  },
});

/** Says until when it is measured again. After a recheck, it asks for one more: the incident is open again. */
export const setRecheck = defineCommand({
  verb: "setRecheck",
  permission: qualityMay.handle,
  input: setRecheckInput,
  areas: areaOfIncident,
  run(ctx, { incidentId, recheckDueAt }) {
    getUnclosed(ctx.db, incidentId);
    if (recheckDueAt <= ctx.at) throw invalidField("/recheckDueAt", "past", "The recheck must lie ahead.");
    ctx.db.update(incident).set({ recheckDueAt, state: "open" }).where(eq(incident.id, incidentId)).run();
    return {
      result: { incidentId },
      event: { kind: qualityEvents.recheckSet, subject: subjectOf(incidentId), payload: { recheckDueAt } },
    };
  },
});
