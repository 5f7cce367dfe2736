import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { may } from "@/modules/access";
import { listPersonNames } from "@/modules/identity";
import { getLimitWorkbook, measurementsMay } from "@/modules/measurements";
import { LimitWorkbookPage } from "@/modules/measurements/ui/limit-workbook";
import { listParameters } from "@/modules/methods";

export const metadata: Metadata = { title: "Change of limits" };

type Props = { params: Promise<{ workbookId: string }> };

export default async function LimitWorkbookRoute({ params }: Props) {
  const actor = await pageActor();
  const detail = await askPage(getLimitWorkbook, await params);
  const people = await askPage(listPersonNames, {});
  return (
    <LimitWorkbookPage
      detail={detail}
      parameters={await askPage(listParameters, { includeRetired: true })}
      names={Object.fromEntries(people.map(({ id, name }) => [id, name]))}
      zone={settings().STILLWELL_ZONE}
      viewerId={actor.personId}
      mayApprove={may(actor, measurementsMay.approveLimits)}
    />
  );
}
