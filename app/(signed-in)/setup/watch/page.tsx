import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { may } from "@/modules/access";
import { listWatchPlan, measurementsMay } from "@/modules/measurements";
import { WatchSetup } from "@/modules/measurements/ui/watch-setup";
import { listInstruments, listMethods, listParameters } from "@/modules/methods";
import { listPoints, listSystems } from "@/modules/systems";

export const metadata: Metadata = { title: "What is read where" };

type Props = { searchParams: Promise<{ system?: string | string[] }> };

export default async function WatchSetupPage({ searchParams }: Props) {
  const actor = await pageActor();
  const { system: code } = await searchParams;
  const systems = await askPage(listSystems, {});
  const points = await askPage(listPoints, {});
  const system = systems.find((each) => each.code === code);
  return (
    <WatchSetup
      key={system?.code ?? ""}
      systems={systems.map(({ code, name }) => ({ code, name }))}
      selected={
        system ? { code: system.code, points: points.filter((each) => each.systemId === system.id) } : null
      }
      allPoints={points}
      plan={await askPage(listWatchPlan, {})}
      parameters={await askPage(listParameters, { includeRetired: true })}
      methods={await askPage(listMethods, {})}
      instruments={await askPage(listInstruments, {})}
      mayPlan={may(actor, measurementsMay.planWatch)}
    />
  );
}
