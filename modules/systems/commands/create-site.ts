import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { createSiteInput } from "../input";
import { site } from "../schema";
import { mustBeFreeCode } from "./free-code";

export const createSite = defineCommand({
  verb: "createSite",
  permission: systemsMay.manageAreas,
  input: createSiteInput,
  run({ db }, input) {
    mustBeFreeCode(db, site, input.code);
    const { id } = db.insert(site).values(input).returning({ id: site.id }).get();
    return {
      result: { id, code: input.code },
      event: { kind: systemsEvents.siteCreated, subject: { type: "site", id } },
    };
  },
});
