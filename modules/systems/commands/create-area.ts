import type { Orm } from "@/db/database";
import { invalidField, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { createAreaInput } from "../input";
import { getSite } from "../records";
import { area, site } from "../schema";
import { mustBeFreeCode } from "./free-code";

export const createArea = defineCommand({
  verb: "createArea",
  permission: systemsMay.manageAreas,
  input: createAreaInput,
  run({ db }, { siteId, ...fields }) {
    mustBeFreeCode(db, area, fields.code);
    const values = { ...fields, siteId: siteId === null ? onlySiteId(db) : getSite(db, siteId).id };
    const { id } = db.insert(area).values(values).returning({ id: area.id }).get();
    return {
      result: { id, code: fields.code },
      event: { kind: systemsEvents.areaCreated, subject: { type: "area", id } },
    };
  },
});

function onlySiteId(db: Orm): number {
  const [first, second] = db.select({ id: site.id }).from(site).limit(2).all();
  if (!first) throw new Problem("conflict", "Set up the site first: every area belongs to one.");
  if (second) throw invalidField("/siteId", "required", "Choose the site that the area belongs to.");
  return first.id;
}
