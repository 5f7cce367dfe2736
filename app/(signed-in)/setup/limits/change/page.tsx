import type { Metadata } from "next";
import { askPage, mustMay } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { listLimitBoard, listLimitTemplates, measurementsMay } from "@/modules/measurements";
import { LimitEditor } from "@/modules/measurements/ui/limit-editor";
import { listParameters } from "@/modules/methods";
import { listPoints } from "@/modules/systems";

export const metadata: Metadata = { title: "Change limits" };

type Props = { searchParams: Promise<{ system?: string | string[] }> };

export default async function ChangeLimitsPage({ searchParams }: Props) {
  await mustMay(measurementsMay.proposeLimits);
  const { system } = await searchParams;
  const parameters = await askPage(listParameters, {});
  return (
    <LimitEditor
      systemCode={typeof system === "string" ? system : null}
      points={await askPage(listPoints, {})}
      parameters={parameters.filter((each) => each.kind === "number" || each.kind === "count")}
      board={await askPage(listLimitBoard, {})}
      templates={await askPage(listLimitTemplates, {})}
      zone={settings().STILLWELL_ZONE}
      now={systemClock.now()}
    />
  );
}
