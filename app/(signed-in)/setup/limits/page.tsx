import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { LinkButton, PageHead, Panel } from "@/lib/ui";
import { may } from "@/modules/access";
import { listPersonNames } from "@/modules/identity";
import { listLimitBoard, listLimitWorkbooks, measurementsMay } from "@/modules/measurements";
import { LimitBoard } from "@/modules/measurements/ui/limit-board";
import { LimitWorkbooksTable } from "@/modules/measurements/ui/limit-workbooks-table";
import { SystemPicker } from "@/modules/measurements/ui/system-picker";
import { listParameters } from "@/modules/methods";
import { listSystems } from "@/modules/systems";

export const metadata: Metadata = { title: "Limits" };

type Props = { searchParams: Promise<{ system?: string | string[] }> };

export default async function LimitsPage({ searchParams }: Props) {
  const actor = await pageActor();
  const { system: code } = await searchParams;
  const systems = await askPage(listSystems, {});
  const waiting = await askPage(listLimitWorkbooks, { state: "proposed" });
  const people = await askPage(listPersonNames, {});
  const names = Object.fromEntries(people.map(({ id, name }) => [id, name]));
  const zone = settings().STILLWELL_ZONE;
  const system = systems.find((each) => each.code === code);
  return (
    <>
      <PageHead
        title="Limits"
        facts="What each reading is judged by. A change holds once another person has approved it."
        actions={
          <>
            {may(actor, measurementsMay.proposeLimits) && (
              <LinkButton
                variant="next"
                href={system ? `/setup/limits/change?system=${system.code}` : "/setup/limits/change"}
              >
                Change limits…
              </LinkButton>
            )}
            <LinkButton href="/setup/limits/templates">Templates</LinkButton>
            <LinkButton href="/setup/limits/workbooks">All changes</LinkButton>
          </>
        }
      />
      <div className="grid gap-5">
        {waiting.length > 0 && (
          <Panel title="Waiting for approval">
            <LimitWorkbooksTable
              workbooks={waiting}
              names={names}
              zone={zone}
              caption="Changes of limits that wait for approval"
              emptyText=""
            />
          </Panel>
        )}
        <SystemPicker path="/setup/limits" systems={systems} selected={system?.code ?? null} />
        {system && (
          <Panel title={`${system.code} ${system.name}`} aside="in force now">
            <LimitBoard
              systemCode={system.code}
              rows={await askPage(listLimitBoard, { systemId: system.id })}
              parameters={await askPage(listParameters, { includeRetired: true })}
              names={names}
              zone={zone}
            />
          </Panel>
        )}
      </div>
    </>
  );
}
