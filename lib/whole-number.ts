import { z } from "zod";

/** A whole number, as such or as a form or an address carries it; an empty text is not 0. */
export const wholeNumber = (min: number, max: number, message: string) =>
  z.union([z.number(), z.string().trim()], message).transform((given, context) => {
    const value = typeof given === "number" ? given : /^-?\d+$/.test(given) ? Number(given) : Number.NaN;
    if (Number.isSafeInteger(value) && value >= min && value <= max) return value;
    context.addIssue({ code: "custom", message });
    return z.NEVER;
  });
