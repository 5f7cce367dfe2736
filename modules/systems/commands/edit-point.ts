import { and, eq, ne } from "drizzle-orm";
import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { editPointInput } from "../input";
import { getPoint } from "../records";
import { point } from "../schema";
import { mustBeFreeCode } from "./free-code";

/** Renames a point, makes it the default, or takes it out of use; a system always has one default point in use. */
export const editPoint = defineCommand({
  verb: "editPoint",
  permission: systemsMay.manageSystems,
  input: editPointInput,
  run({ db }, { pointId, ...fields }) {
    const before = getPoint(db, pointId);
    const { systemId } = before;
    if (before.isDefault && !fields.isDefault) {
      throw invalidField(
        "/isDefault",
        "default",
        "Every system has a default point: make another one the default instead.",
      );
    }
    if (fields.isDefault && !fields.isInUse) {
      throw invalidField(
        "/isInUse",
        "default",
        "The default point stays in use: make another one the default first.",
      );
    }
    mustBeFreeCode(db, point, fields.code, { exceptId: pointId, within: eq(point.systemId, systemId) });
    if (fields.isDefault) {
      db.update(point)
        .set({ isDefault: false })
        .where(and(eq(point.systemId, systemId), ne(point.id, pointId), eq(point.isDefault, true)))
        .run();
    }
    db.update(point).set(fields).where(eq(point.id, pointId)).run();
    return {
      result: { id: pointId, code: fields.code },
      event: {
        kind: systemsEvents.pointEdited,
        subject: { type: "point", id: pointId },
        payload: { systemId },
      },
    };
  },
});
