import { z } from "zod";

const id = z.coerce.number().int().positive();
const moment = z.number({ error: "Say when." }).int().min(0);
const title = z
  .string()
  .trim()
  .min(3, "Say in a few words what is wrong.")
  .max(120, "Keep the title under 120 characters.");
const noteText = z
  .string()
  .trim()
  .min(3, "Write a sentence.")
  .max(2000, "Keep the note under 2,000 characters.");

/** From a reading that is off, or by hand for a system (with the point and parameter where they are known). */
export const openIncidentInput = z
  .strictObject({
    readingId: id.optional(),
    systemId: id.optional(),
    pointId: id.optional(),
    parameterId: id.optional(),
    title,
    note: z.string().trim().max(2000, "Keep the note under 2,000 characters.").default(""),
    ownerId: id.optional(),
    recheckDueAt: moment.optional(),
  })
  .superRefine((value, ctx) => {
    if (value.readingId === undefined && value.systemId === undefined) {
      ctx.addIssue({ code: "custom", path: ["systemId"], message: "Say which system it is about." });
    }
    if ((value.pointId === undefined) !== (value.parameterId === undefined)) {
      ctx.addIssue({
        code: "custom",
        path: [value.pointId === undefined ? "pointId" : "parameterId"],
        message: "Name both the point and the parameter, or neither.",
      });
    }
  });

export const joinReadingInput = z.strictObject({ incidentId: id, readingId: id });
export const addNoteInput = z.strictObject({ incidentId: id, text: noteText });
export const setOwnerInput = z.strictObject({ incidentId: id, ownerId: id });
export const setRecheckInput = z.strictObject({ incidentId: id, recheckDueAt: moment });
export const recordRecheckInput = z.strictObject({ incidentId: id, readingId: id });

export const closeIncidentInput = z.strictObject({
  incidentId: id,
  closureText: z
    .string()
    .trim()
    .min(10, "Say what was found and what was done.")
    .max(2000, "Keep it under 2,000 characters."),
  /** Needed while the newest reading is still off. */
  stillOffReason: z.string().trim().max(500, "Keep it under 500 characters.").default(""),
});

export const listIncidentsInput = z.strictObject({
  state: z.enum(["open", "rechecked", "closed", "unclosed", "all"]).default("unclosed"),
  systemId: id.optional(),
  limit: z.coerce.number().int().min(1).max(500).default(200),
});

export const incidentKey = z.strictObject({ incidentId: id });
export const troubleKey = z.strictObject({ pointId: id, parameterId: id });

/** A recheck is asked for within a number of hours. */
const recheckHours = z.coerce.number({ error: "Say in how many hours." }).int().min(1).max(336);

/** What the form of a new incident asks; where it is about follows from the reading or is chosen. */
export const newIncidentForm = z.strictObject({
  title,
  note: z.string().trim().max(2000, "Keep the note under 2,000 characters."),
  recheckHours: z.union([z.literal("").transform(() => null), recheckHours]),
});
export const incidentByHandForm = newIncidentForm.extend({
  systemId: z.coerce.number({ error: "Choose a system." }).int().positive("Choose a system."),
});
export const noteForm = z.strictObject({ text: noteText });
export const closureForm = closeIncidentInput.omit({ incidentId: true });
