import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settingsInForce } from "@/app/_server/settings-in-force";
import { HealthPanel } from "@/app/(signed-in)/today/health-panel";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { type DataColumn, DataTable, PageHead, Panel } from "@/lib/ui";
import { may } from "@/modules/access";
import { auditMay, getHealth, listBackups, listTroubledJobs } from "@/modules/audit";
import { BackupsPanel } from "@/modules/audit/ui/backups-panel";
import { JobsPanel } from "@/modules/audit/ui/jobs-panel";
import { countMail, notificationsMay } from "@/modules/notifications";

export const metadata: Metadata = { title: "Health and backup" };

type Setting = { name: string; value: string };

const SETTING_COLUMNS: DataColumn<Setting>[] = [
  {
    id: "name",
    head: "Setting",
    rowHead: true,
    cell: ({ name }) => <code className="font-mono text-sm font-normal break-all">{name}</code>,
  },
  { id: "value", head: "In force", cell: ({ value }) => <span className="break-all">{value}</span> },
];

export default async function HealthPage() {
  const health = await askPage(getHealth, {});
  const [actor, zone] = [await pageActor(), settings().STILLWELL_ZONE];
  const { made, waiting } = await askPage(listBackups, {});
  const jobs = await askPage(listTroubledJobs, {});
  const mail = may(actor, notificationsMay.readOutbox) ? await askPage(countMail, {}) : null;
  return (
    <>
      <PageHead title="Health and backup" facts="How this installation is, and what it needs from you." />
      <div className="grid gap-5">
        <HealthPanel health={health} mail={mail} zone={zone} now={systemClock.now()} />
        <BackupsPanel made={made} waiting={waiting} mayAsk={may(actor, auditMay.askForBackup)} zone={zone} />
        <JobsPanel jobs={jobs} mayRetry={may(actor, auditMay.retryJobs)} zone={zone} />
        <Panel title="Settings in force">
          <p className="mb-3 max-w-prose text-ink-2">
            Settings are read once, when the server starts. Secrets are never shown.
          </p>
          <DataTable
            caption="Settings in force"
            columns={SETTING_COLUMNS}
            rows={settingsInForce()}
            rowKey={({ name }) => name}
          />
        </Panel>
      </div>
    </>
  );
}
