import { z } from "zod";
import { STAGED_OUTCOMES } from "./model";

const importId = z.coerce.number().int().positive();
const why = z.string().trim().min(3, "Say why in a few words.").max(500, "Keep it under 500 characters.");

export const importIdInput = z.strictObject({ importId });

/** The name a file is brought under. */
export const fileNameInput = z
  .string()
  .trim()
  .min(1, "Say the file's name.")
  .max(200, "The file's name is longer than 200 characters. Shorten it.")
  .refine(
    (name) => !/[/\\\u0000-\u001f]/.test(name),
    "A file's name has no slashes and no control characters.",
  );

/** What a person says about the whole file; what is left out stays as it was. */
export const answerQuestionsInput = z.strictObject({
  importId,
  dateOrder: z.enum(["day-first", "month-first"]).optional(),
  decimalSign: z.enum(["point", "comma"]).optional(),
  doubledHour: z.enum(["earlier", "later", "refuse"]).optional(),
  /** The system of rows that name none. */
  system: z.string().trim().min(1).max(80).optional(),
  /** The worksheet to read. */
  sheet: z.string().min(1).max(200).optional(),
});

export const withdrawImportInput = z.strictObject({ importId, reason: why });

export const listImportsInput = z.strictObject({
  before: z.coerce.number().int().positive().optional(),
  limit: z.coerce.number().int().min(1).max(100).default(30),
});

export const getImportInput = z.union([
  importIdInput,
  z.strictObject({ code: z.string().regex(/^I\d{2}-\d{4,}$/i, "Imports are numbered such as I26-0042.") }),
]);

export const listStagedRowsInput = z.strictObject({
  importId,
  outcome: z.enum([...STAGED_OUTCOMES, "all"]).default("all"),
  /** Only readings that are expected to be out of tolerance or implausible. */
  off: z.enum(["0", "1"]).default("0"),
  after: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(1000).default(50),
});
