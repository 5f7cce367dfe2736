import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { may, mayInArea } from "@/modules/access";
import { getOwnAccount } from "@/modules/identity";
import { listSystems, systemsMay, volumeOf } from "@/modules/systems";
import { VolumePage } from "@/modules/systems/ui/volume-page";
import { readingUnits } from "@/modules/systems/ui/volume-units";

type Props = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Volume of ${(await params).code}` };
}

export default async function SystemVolumePage({ params }: Props) {
  const actor = await pageActor();
  const sheet = await askPage(volumeOf, await params);
  const systems = await askPage(listSystems, {});
  const account = await askPage(getOwnAccount, {});
  const { areaId } = sheet.system;
  return (
    <VolumePage
      sheet={sheet}
      systems={systems}
      zone={settings().STILLWELL_ZONE}
      units={readingUnits(account?.preferredUnits ?? {})}
      personId={actor.personId}
      may={{
        propose: mayInArea(actor, systemsMay.proposeVolume, areaId),
        approve: may(actor, systemsMay.approveVolume),
        setLevel: mayInArea(actor, systemsMay.setOperatingLevel, areaId),
      }}
    />
  );
}
