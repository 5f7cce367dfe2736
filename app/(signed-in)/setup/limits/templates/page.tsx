import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { may } from "@/modules/access";
import { listLimitTemplates, measurementsMay } from "@/modules/measurements";
import { LimitTemplates } from "@/modules/measurements/ui/limit-templates";
import { listParameters } from "@/modules/methods";

export const metadata: Metadata = { title: "Templates of limits" };

export default async function LimitTemplatesPage() {
  const actor = await pageActor();
  const parameters = await askPage(listParameters, {});
  return (
    <LimitTemplates
      templates={await askPage(listLimitTemplates, {})}
      parameters={parameters.filter((each) => each.kind === "number" || each.kind === "count")}
      zone={settings().STILLWELL_ZONE}
      mayPropose={may(actor, measurementsMay.proposeLimits)}
    />
  );
}
