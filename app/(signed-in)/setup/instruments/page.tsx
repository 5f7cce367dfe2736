import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { may } from "@/modules/access";
import { listInstruments, methodsMay } from "@/modules/methods";
import { InstrumentsSetup } from "@/modules/methods/ui/instruments-setup";

export const metadata: Metadata = { title: "Instruments" };

export default async function InstrumentsPage() {
  const actor = await pageActor();
  const instruments = await askPage(listInstruments, { includeRetired: true });
  return (
    <InstrumentsSetup
      instruments={instruments}
      zone={settings().STILLWELL_ZONE}
      mayManage={may(actor, methodsMay.manageInstruments)}
    />
  );
}
