import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { may } from "@/modules/access";
import { listMethods, listParameters, methodsMay } from "@/modules/methods";
import { MethodsSetup } from "@/modules/methods/ui/methods-setup";

export const metadata: Metadata = { title: "Methods" };

export default async function MethodsPage() {
  const actor = await pageActor();
  const methods = await askPage(listMethods, { includeRetired: true });
  const parameters = await askPage(listParameters, {});
  return (
    <MethodsSetup
      methods={methods}
      parameters={parameters}
      mayManage={may(actor, methodsMay.manageMethods)}
    />
  );
}
