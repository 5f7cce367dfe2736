import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { agoText, LinkButton } from "@/lib/ui";
import { may } from "@/modules/access";
import { getOwnAccount } from "@/modules/identity";
import { listWatch } from "@/modules/measurements";
import { newestAt, OffWords, worstOf } from "@/modules/measurements/ui/off-words";
import { listOperatingVolumes, listSystems, systemsMay } from "@/modules/systems";
import { SystemsList } from "@/modules/systems/ui/systems-list";
import { shownVolumeUnit } from "@/modules/systems/ui/volume-units";

export const metadata: Metadata = { title: "Systems" };

export default async function SystemsPage() {
  const actor = await pageActor();
  const systems = await askPage(listSystems, {});
  const watch = await askPage(listWatch, { recent: 1 });
  const volumes = await askPage(listOperatingVolumes, {});
  const account = await askPage(getOwnAccount, {});
  const now = systemClock.now();
  const listed = systems.map((system) => {
    const rows = watch.filter((row) => row.systemId === system.id);
    const worst = worstOf(rows);
    const newest = newestAt(rows);
    return {
      ...system,
      operating: volumes.find((each) => each.systemId === system.id)?.volume ?? null,
      worst,
      off: worst === null ? null : <OffWords rows={rows} />,
      newest: newest === null ? "none yet" : agoText(newest, now),
    };
  });
  return (
    <SystemsList
      systems={listed}
      volumeUnit={shownVolumeUnit(
        account?.preferredUnits ?? {},
        Math.max(0, ...systems.map((each) => each.volumeL ?? 0)),
      )}
      actions={
        may(actor, systemsMay.manageSystems) && <LinkButton href="/setup/systems">Set up systems</LinkButton>
      }
    />
  );
}
