import type { Metadata } from "next";
import Link from "next/link";
import { rowsToType } from "@/app/_server/preferred-units";
import { askPage, mustMay, refusePage } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { numberText } from "@/lib/ui";
import { convertByFactor } from "@/lib/units/factors";
import { mayInArea } from "@/modules/access";
import { getOwnAccount, listPersonNames } from "@/modules/identity";
import { listWatch, measurementsMay } from "@/modules/measurements";
import { getSystem, listSystems } from "@/modules/systems";
import { plainVolume } from "@/modules/systems/ui/volume-text";
import { shownVolumeUnit } from "@/modules/systems/ui/volume-units";
import { EntryWithIncidents } from "./entry-with-incidents";

type Props = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Readings of ${(await params).code}` };
}

export default async function EntryPage({ params }: Props) {
  const actor = await mustMay(measurementsMay.record);
  const system = await askPage(getSystem, await params);
  if (actor.personId === null || !mayInArea(actor, measurementsMay.record, system.areaId)) {
    return refusePage(actor, measurementsMay.record);
  }
  const rows = await rowsToType(await askPage(listWatch, { systemId: system.id, recent: 20 }));
  const people = await askPage(listPersonNames, {});
  const account = await askPage(getOwnAccount, {});
  const walk = await askPage(listSystems, { areaId: system.areaId });
  const here = walk.findIndex((each) => each.id === system.id);
  const volume = shownVolumeUnit(account?.preferredUnits ?? {}, system.volumeL);
  const shown = plainVolume(convertByFactor(system.volumeL ?? 0, "L", volume));
  return (
    <EntryWithIncidents
      key={system.id}
      system={{ code: system.code, name: system.name }}
      facts={
        <>
          {system.areaName}
          {walk.length > 1 && here >= 0 && `, system ${here + 1} of ${walk.length}`}
          {system.volumeL !== null && (
            <>
              {" · "}
              {numberText(shown.value, shown.decimals)} {volume}
            </>
          )}
          {" · "}
          <Link href={`/systems/${system.code}`}>this system's page</Link>
        </>
      }
      rows={rows}
      people={people.filter((each) => each.state === "active")}
      personId={actor.personId}
      zone={settings().STILLWELL_ZONE}
      now={systemClock.now()}
      nextCode={walk[here + 1]?.code ?? null}
    />
  );
}
