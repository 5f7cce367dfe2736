import { and, asc, eq, isNull } from "drizzle-orm";
import { defineQuery } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { listMethodsInput } from "../input";
import type { MethodRow } from "../model";
import { method, parameter } from "../schema";

/** The methods by code; of one parameter, and retired ones, only when asked for. */
export const listMethods = defineQuery({
  name: "listMethods",
  permission: methodsMay.read,
  input: listMethodsInput,
  run: ({ db }, { parameterId, includeRetired }): MethodRow[] =>
    db
      .select({
        id: method.id,
        code: method.code,
        name: method.name,
        parameterId: method.parameterId,
        parameterName: parameter.name,
        principle: method.principle,
        retiredAt: method.retiredAt,
      })
      .from(method)
      .innerJoin(parameter, eq(parameter.id, method.parameterId))
      .where(
        and(
          parameterId === undefined ? undefined : eq(method.parameterId, parameterId),
          includeRetired ? undefined : isNull(method.retiredAt),
        ),
      )
      .orderBy(asc(method.code))
      .all()
      .map(({ retiredAt, ...row }) => ({ ...row, isRetired: retiredAt !== null })),
});
