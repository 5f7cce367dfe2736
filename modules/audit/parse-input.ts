import type { z } from "zod";
import { type FieldProblem, Problem } from "@/lib/problem";

const pointerOf = (path: readonly PropertyKey[]): string =>
  path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");

/**
 * Checks what was sent against its schema, all issues at once.
 * @throws Problem `invalid` with a JSON pointer (RFC 6901) and a sentence per wrong field.
 */
export function parseInput<S extends z.ZodType>(schema: S, raw: unknown): z.output<S> {
  const parsed = schema.safeParse(raw);
  if (parsed.success) return parsed.data;
  const errors: FieldProblem[] = parsed.error.issues.map((issue) => ({
    pointer: pointerOf(issue.path),
    code: issue.code,
    detail: issue.message,
  }));
  const count = errors.length === 1 ? "One thing" : `${errors.length} things`;
  throw new Problem("invalid", `${count} must be mended before this can be taken.`, errors);
}
