import { and, eq, ne, sql } from "drizzle-orm";
import { invariant } from "@/lib/invariant";
import { type FieldProblem, invalidField, notFound, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { saveLimitTemplateInput } from "../input";
import { checkLimitShape } from "../rules/order-of-limits";
import { limitTemplate } from "../schema";

/** Keeps limits by parameter under a name, to lay them on many systems at once (as a proposal). */
export const saveLimitTemplate = defineCommand({
  verb: "saveLimitTemplate",
  permission: measurementsMay.proposeLimits,
  input: saveLimitTemplateInput,
  run(ctx, { templateId, name, note, rows }) {
    invariant(ctx.actor.personId !== null, "a person keeps a template");
    const problems = rows.flatMap(({ parameterId, shape }, index): FieldProblem[] => {
      const parameter = getParameter(ctx.db, parameterId);
      return checkLimitShape(shape, { plausible: parameter.plausible, decimals: parameter.decimals }).map(
        (problem) => ({
          pointer: `/rows/${index}/shape`,
          code: problem.code,
          detail: `${parameter.name}: ${problem.sentence}`,
        }),
      );
    });
    if (problems.length > 0)
      throw new Problem("invalid", problems[0]?.detail ?? "Some limits cannot be used.", problems);
    const taken = ctx.db
      .select({ id: limitTemplate.id })
      .from(limitTemplate)
      .where(
        and(
          sql`lower(${limitTemplate.name}) = lower(${name})`,
          templateId ? ne(limitTemplate.id, templateId) : undefined,
        ),
      )
      .get();
    if (taken) throw invalidField("/name", "taken", "There is a template with this name already.");
    const values = { name, note, rows, changedBy: ctx.actor.personId, changedAt: ctx.at };
    const saved = templateId
      ? ctx.db.update(limitTemplate).set(values).where(eq(limitTemplate.id, templateId)).returning().get()
      : ctx.db.insert(limitTemplate).values(values).returning().get();
    if (!saved) throw notFound("such template");
    return {
      result: { templateId: saved.id },
      event: { kind: measurementsEvents.templateSaved, subject: { type: "limit-template", id: saved.id } },
    };
  },
});
