import { z } from "zod";

const id = z.coerce.number().int().positive();
const moment = z.number().int().min(0);
const why = z.string().trim().min(3, "Say why in a few words.").max(500, "Keep it under 500 characters.");
const note = z.string().trim().max(1000, "Keep the note under 1,000 characters.");

/** One value as a person or a machine sends it. `typedText` is kept as it is. */
export const readingInput = z.strictObject({
  uuid: z.uuid("Each reading carries a UUID of its own."),
  pointId: id,
  parameterId: id,
  typedText: z.string().min(1, "Type a value.").max(2000, "The value is too long."),
  typedUnit: z.string().max(40).nullish(),
  takenAt: moment,
  /** Who took it, where that is not the person who enters it. */
  takenBy: id.nullish(),
  methodId: id.nullish(),
  instrumentId: id.nullish(),
  note: note.nullish(),
  /** The person has looked again: the instrument shows this, although it is off. */
  confirmed: z.boolean().default(false),
});
export type ReadingInput = z.output<typeof readingInput>;

/** A reading of a file: as typed, and in plain form where the file has conventions of its own. */
export const deliveredReadingInput = readingInput.extend({
  /** The value with a decimal point and without groups. */
  plainText: z.string().min(1).max(2000).nullish(),
});
export type DeliveredReading = ReadingInput & { plainText?: string | null | undefined };

export const recordReadingsInput = z.strictObject({
  source: z.enum(["entry", "grid"]).default("entry"),
  readings: z
    .array(readingInput)
    .min(1, "Send at least one reading.")
    .max(500, "Send at most 500 readings at once."),
});

export const correctReadingInput = z.strictObject({
  readingId: id,
  uuid: z.uuid(),
  typedText: z.string().min(1, "Type the new value.").max(2000),
  typedUnit: z.string().max(40).nullish(),
  takenAt: moment.optional(),
  reason: why,
  confirmed: z.boolean().default(false),
});

export const voidReadingInput = z.strictObject({ readingId: id, reason: why });
export const confirmReadingInput = z.strictObject({ readingId: id });
export const explainReadingInput = z.strictObject({ readingId: id, text: why });

const bound = z.number().refine(Number.isFinite, "Write a number.");

export const boundsInput = z.strictObject({
  target: bound.optional(),
  watchLow: bound.optional(),
  watchHigh: bound.optional(),
  toleranceLow: bound.optional(),
  toleranceHigh: bound.optional(),
  greatestChange24h: bound.optional(),
});

/** How limits run through time; values in the parameter's canonical unit. */
export const limitShapeInput = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("constant"), bounds: boundsInput }),
  z.strictObject({
    kind: z.literal("ramp"),
    knots: z
      .array(z.strictObject({ at: moment, bounds: boundsInput }))
      .min(2, "A ramp needs a beginning and an end."),
  }),
  z.strictObject({
    kind: z.literal("season"),
    knots: z
      .array(
        z.strictObject({
          monthDay: z.string().regex(/^\d{2}-\d{2}$/, "Write month and day, such as 03-21."),
          bounds: boundsInput,
        }),
      )
      .min(2, "A season needs at least two days of the year."),
  }),
]);

export const limitRowInput = z.strictObject({
  pointId: id,
  parameterId: id,
  effectiveFromAt: moment,
  effectiveToAt: moment.nullish(),
  shape: limitShapeInput,
  suspendedReason: why.nullish(),
});

export const proposeLimitsInput = z.strictObject({
  title: z.string().trim().min(3, "Give the change a title.").max(120),
  reason: why,
  rows: z.array(limitRowInput).min(1, "Change at least one limit.").max(2000),
});

/** What the form asks about a workbook as a whole; its rows are read by the sheet below it. */
export const limitWorkbookFormInput = z.strictObject({
  title: proposeLimitsInput.shape.title,
  reason: proposeLimitsInput.shape.reason,
  /** Facility time, "YYYY-MM-DDTHH:MM". */
  from: z.string().regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/, "Say from when the limits hold."),
  to: z.string().regex(/^(\d{4}-\d{2}-\d{2}T\d{2}:\d{2})?$/, "Give day and time, or leave it empty."),
});

export const decideLimitsInput = z.strictObject({
  workbookId: id,
  decision: z.enum(["approve", "decline"]),
  comment: z.string().trim().max(500).default(""),
});

/** What a person types to decide: the comment, and their password as a signature. */
export const decideLimitsFormInput = z.strictObject({
  comment: decideLimitsInput.shape.comment,
  password: z.string().min(1, "Type your password to sign."),
});

export const saveLimitTemplateInput = z.strictObject({
  templateId: id.nullish(),
  name: z.string().trim().min(2, "Give the template a name.").max(80),
  note: note.default(""),
  rows: z
    .array(z.strictObject({ parameterId: id, shape: limitShapeInput }))
    .min(1, "Put at least one limit into it.")
    .max(200),
});

export const limitTemplateFormInput = saveLimitTemplateInput.pick({ name: true, note: true });

export const planWatchInput = z.strictObject({
  pointId: id,
  items: z
    .array(
      z.strictObject({
        parameterId: id,
        everyDays: z.number().int().min(1).max(366).nullish(),
        unit: z.string().max(40).nullish(),
        methodId: id.nullish(),
        instrumentId: id.nullish(),
      }),
    )
    .max(100),
});
