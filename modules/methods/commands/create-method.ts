import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { createMethodInput } from "../input";
import { getParameter } from "../parameters";
import { mustBeFree } from "../records";
import { method } from "../schema";

export const createMethod = defineCommand({
  verb: "createMethod",
  permission: methodsMay.manageMethods,
  input: createMethodInput,
  run({ db }, fields) {
    mustBeFree(db, method, "code", fields.code);
    const measured = getParameter(db, fields.parameterId);
    if (measured.isRetired) {
      throw invalidField("/parameterId", "retired", `${measured.name} is retired: choose another parameter.`);
    }
    const { id } = db.insert(method).values(fields).returning({ id: method.id }).get();
    return {
      result: { id, code: fields.code },
      event: { kind: methodsEvents.methodCreated, subject: { type: "method", id } },
    };
  },
});
