import type { Metadata } from "next";
import { askPage, mustMay } from "@/app/_server/session";
import { PageHead } from "@/lib/ui";
import { identityMay } from "@/modules/identity";
import { InviteForm } from "@/modules/identity/ui/invite-form";
import { listAreas } from "@/modules/systems";

export const metadata: Metadata = { title: "Invite somebody" };

export default async function InvitePage() {
  await mustMay(identityMay.managePeople);
  const areas = await askPage(listAreas, {});
  return (
    <>
      <PageHead
        title="Invite somebody"
        facts="They get a letter with a link that works once, for seven days, and choose their own password."
      />
      <InviteForm areas={areas.map(({ id, name }) => ({ id, name }))} />
    </>
  );
}
