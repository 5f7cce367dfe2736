import type { Metadata } from "next";
import { askPage, pageActor, refusePage } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { EmptyState, PageHead } from "@/lib/ui";
import { mayInArea } from "@/modules/access";
import { listPersonNames } from "@/modules/identity";
import { listWatch, measurementsMay } from "@/modules/measurements";
import { DeskGrid } from "@/modules/measurements/ui/desk-grid";
import { GridAreas } from "@/modules/measurements/ui/grid-areas";
import { listAreas } from "@/modules/systems";

export const metadata: Metadata = { title: "Desk grid" };

type Props = { searchParams: Promise<{ areas?: string | string[] }> };

/** Enough to see a change in 24 h and a slip; the server looks at all of them. */
const RECENT = 8;

export default async function DeskGridPage({ searchParams }: Props) {
  const actor = await pageActor();
  const seen = await askPage(listAreas, {});
  const areas = seen.filter((area) => mayInArea(actor, measurementsMay.record, area.id));
  if (actor.personId === null || areas.length === 0) return refusePage(actor, measurementsMay.record);
  const asked = String((await searchParams).areas ?? "")
    .split(",")
    .map(Number);
  const known = areas.filter((area) => asked.includes(area.id)).map((area) => area.id);
  const chosen = known.length > 0 ? known : areas.slice(0, 1).map((area) => area.id);
  const watched = await Promise.all(chosen.map((areaId) => askPage(listWatch, { areaId, recent: RECENT })));
  const rows = watched.flat();
  const people = await askPage(listPersonNames, {});
  return (
    <>
      <PageHead title="Desk grid" facts="Many systems on one sheet: type, press Enter, go on." />
      <div className="grid gap-4">
        <GridAreas areas={areas} chosen={chosen} />
        {rows.length === 0 ? (
          <EmptyState title="Nothing is read in this area yet">
            <p>A lead says under Setup what is read at each point; then it stands here as a sheet.</p>
          </EmptyState>
        ) : (
          <DeskGrid
            key={chosen.join(",")}
            rows={rows}
            people={people.filter((each) => each.state === "active")}
            personId={actor.personId}
            zone={settings().STILLWELL_ZONE}
          />
        )}
      </div>
    </>
  );
}
