import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { may } from "@/modules/access";
import { getSystem, listAreas, systemsMay } from "@/modules/systems";
import { SystemSetup } from "@/modules/systems/ui/system-setup";

type Props = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `${(await params).code} setup` };
}

export default async function SystemSetupPage({ params }: Props) {
  const actor = await pageActor();
  const system = await askPage(getSystem, await params);
  const areas = await askPage(listAreas, {});
  return (
    <SystemSetup
      system={system}
      areas={areas}
      zone={settings().STILLWELL_ZONE}
      mayManage={may(actor, systemsMay.manageSystems)}
      mayManageEquipment={may(actor, systemsMay.manageEquipment)}
    />
  );
}
