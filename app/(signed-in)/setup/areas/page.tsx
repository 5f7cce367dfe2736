import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { may } from "@/modules/access";
import { listAreas, listSites, systemsMay } from "@/modules/systems";
import { AreasSetup } from "@/modules/systems/ui/areas-setup";

export const metadata: Metadata = { title: "Areas" };

export default async function AreasPage() {
  const actor = await pageActor();
  const [sites, areas] = [await askPage(listSites, {}), await askPage(listAreas, {})];
  return <AreasSetup sites={sites} areas={areas} mayManage={may(actor, systemsMay.manageAreas)} />;
}
