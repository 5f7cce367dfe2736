import { z } from "zod";

export const sheetKey = z.strictObject({
  areaId: z.coerce.number().int().positive(),
  onDay: z.iso.date("Write a day such as 2026-03-01."),
});

export const reviewDaysInput = z.strictObject({
  outcome: z.enum(["reviewed", "returned"]),
  comment: z.string().trim().max(1000).default(""),
  sheets: z
    .array(
      z.strictObject({
        areaId: z.number().int().positive(),
        onDay: z.iso.date(),
        /** Hash of what the person had before them. */
        contentHash: z.string().length(64),
      }),
    )
    .min(1, "Choose at least one sheet.")
    .max(100, "Review at most 100 sheets at once."),
});

/** What the dialog asks of whoever signs. */
export const reviewFormInput = z.strictObject({
  comment: z.string().trim().max(1000, "Keep the comment under 1,000 characters."),
  password: z.string().min(1, "Type your password: it is your signature."),
});
