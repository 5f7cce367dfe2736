import type { Metadata } from "next";
import { askPage } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { PageHead, Pager } from "@/lib/ui";
import { listMail } from "@/modules/notifications";
import { MailTable } from "@/modules/notifications/ui/mail-table";

export const metadata: Metadata = { title: "Mail" };

const PAGE = 50;

const HOW = {
  file: "Letters are written as .eml files into the data folder (mail/); nothing leaves this machine.",
  smtp: "Letters leave by the mail server of the settings.",
};

export default async function OutboxPage({ searchParams }: { searchParams: Promise<{ before?: string }> }) {
  const { before } = await searchParams;
  const mail = await askPage(listMail, { before, limit: PAGE });
  const oldest = mail.at(-1)?.id;
  const { MAIL_TRANSPORT, STILLWELL_ZONE } = settings();
  return (
    <>
      <PageHead title="Mail" facts={HOW[MAIL_TRANSPORT]} />
      <MailTable mail={mail} zone={STILLWELL_ZONE} />
      <Pager
        newerHref={before === undefined ? null : "/setup/outbox"}
        newerText="Newest"
        olderHref={mail.length === PAGE && oldest !== undefined ? `/setup/outbox?before=${oldest}` : null}
      />
    </>
  );
}
