import { eq } from "drizzle-orm";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { editMethodInput } from "../input";
import { getMethod } from "../records";
import { method } from "../schema";

/** Changes a method's words, takes it out of use or back. Its code and its parameter never change. */
export const editMethod = defineCommand({
  verb: "editMethod",
  permission: methodsMay.manageMethods,
  input: editMethodInput,
  run({ db, at }, { methodId, isRetired, name, principle }) {
    const before = getMethod(db, methodId);
    const retiredAt = isRetired ? (before.retiredAt ?? at) : null;
    db.update(method).set({ name, principle, retiredAt }).where(eq(method.id, methodId)).run();
    return {
      result: { id: methodId, code: before.code },
      event: { kind: methodsEvents.methodEdited, subject: { type: "method", id: methodId } },
    };
  },
});
