import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { may } from "@/modules/access";
import { listCatalogue, listParameters, methodsMay } from "@/modules/methods";
import { ParametersSetup } from "@/modules/methods/ui/parameters-setup";

export const metadata: Metadata = { title: "Parameters" };

export default async function ParametersPage() {
  const actor = await pageActor();
  const mayManage = may(actor, methodsMay.manageParameters);
  const parameters = await askPage(listParameters, { includeRetired: true });
  const missing = mayManage ? await askPage(listCatalogue, {}) : [];
  return <ParametersSetup parameters={parameters} missing={missing} mayManage={mayManage} />;
}
