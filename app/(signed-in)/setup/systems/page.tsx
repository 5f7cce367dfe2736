import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { may } from "@/modules/access";
import { getOwnAccount } from "@/modules/identity";
import { listAreas, listSystems, systemsMay } from "@/modules/systems";
import { SystemsSetup } from "@/modules/systems/ui/systems-setup";
import { shownVolumeUnit } from "@/modules/systems/ui/volume-units";

export const metadata: Metadata = { title: "Systems setup" };

export default async function SystemsSetupPage() {
  const actor = await pageActor();
  const systems = await askPage(listSystems, { includeRetired: true });
  const areas = await askPage(listAreas, {});
  const account = await askPage(getOwnAccount, {});
  return (
    <SystemsSetup
      systems={systems}
      areas={areas}
      mayManage={may(actor, systemsMay.manageSystems)}
      volumeUnit={shownVolumeUnit(
        account?.preferredUnits ?? {},
        Math.max(0, ...systems.map((each) => each.volumeL ?? 0)),
      )}
    />
  );
}
