import type { Metadata } from "next";
import { askPage } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { getVerification } from "@/modules/audit";
import { VerificationPage } from "@/modules/audit/ui/verification-page";
import { listPersonNames } from "@/modules/identity";

export const metadata: Metadata = { title: "Is the history whole?" };

export default async function HistoryVerificationPage() {
  const state = await askPage(getVerification, {});
  const people = await askPage(listPersonNames, {});
  return (
    <VerificationPage
      {...state}
      people={Object.fromEntries(people.map(({ id, name }) => [id, name]))}
      zone={settings().STILLWELL_ZONE}
    />
  );
}
