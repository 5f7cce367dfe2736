import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { may } from "@/modules/access";
import { listPersonNames } from "@/modules/identity";
import { getInstrument, listParameters, methodsMay } from "@/modules/methods";
import { InstrumentPage } from "@/modules/methods/ui/instrument-page";

type Props = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: (await params).code };
}

export default async function InstrumentSetupPage({ params }: Props) {
  const actor = await pageActor();
  const instrument = await askPage(getInstrument, await params);
  const parameters = await askPage(listParameters, {});
  const people = await askPage(listPersonNames, {});
  return (
    <InstrumentPage
      instrument={instrument}
      parameters={parameters}
      names={Object.fromEntries(people.map(({ id, name }) => [id, name]))}
      zone={settings().STILLWELL_ZONE}
      mayManage={may(actor, methodsMay.manageInstruments)}
      mayCheck={may(actor, methodsMay.checkInstruments)}
    />
  );
}
