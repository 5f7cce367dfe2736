import Link from "next/link";
import { agoText, Facts, Panel, TimeText } from "@/lib/ui";
import type { Health } from "@/modules/audit";

const GIB = 1024 ** 3;
const MIB = 1024 ** 2;
/** A backup older than this is said to be old; a disk with less room than this is said to be nearly full. */
const OLD_BACKUP_MS = 48 * 3_600_000;
const LITTLE_ROOM_BYTES = 2 * GIB;
/** Work that waits longer than this says that the runner stands still. */
const LONG_WAIT_MS = 5 * 60_000;

const bytesText = (bytes: number): string =>
  bytes >= GIB ? `${(bytes / GIB).toFixed(1)} GiB` : `${(bytes / MIB).toFixed(1)} MiB`;

export interface HealthPanelProps {
  health: Health;
  mail: { queued: number; failed: number } | null;
  zone: string;
  now: number;
}

/** How the installation is; what needs a hand is said in words. */
export function HealthPanel({ health, mail, zone, now }: HealthPanelProps) {
  const { lastBackupAt, oldestDueAt, jobsFailed, diskFreeBytes } = health;
  const warn = (is: boolean, text: string) =>
    is ? <span className="font-semibold text-out">{text}</span> : undefined;
  const backupIsOld = lastBackupAt === null || now - lastBackupAt > OLD_BACKUP_MS;
  const isStuck = oldestDueAt !== null && now - oldestDueAt > LONG_WAIT_MS;
  return (
    <Panel title="Health of this installation" id="health">
      <Facts
        facts={[
          {
            label: "Disk",
            value: `${bytesText(diskFreeBytes)} free`,
            note:
              warn(diskFreeBytes < LITTLE_ROOM_BYTES, "nearly full: make room") ??
              `of ${bytesText(health.diskTotalBytes)}`,
          },
          { label: "Database", value: bytesText(health.databaseBytes) },
          {
            label: "Last backup",
            value: lastBackupAt === null ? "none yet" : <TimeText at={lastBackupAt} zone={zone} />,
            note: warn(backupIsOld, "make one: npm run backup"),
          },
          ...(mail === null
            ? []
            : [
                {
                  label: "Mail",
                  value: `${mail.queued} waiting, ${mail.failed} failed`,
                  note:
                    mail.failed > 0 ? (
                      <Link href="/setup/outbox" className="link">
                        look at the outbox
                      </Link>
                    ) : undefined,
                },
              ]),
          {
            label: "Work in hand",
            value: `${health.jobsDue} due, ${jobsFailed} failed`,
            note:
              oldestDueAt === null
                ? undefined
                : (warn(isStuck, `waiting since ${agoText(oldestDueAt, now)}`) ?? agoText(oldestDueAt, now)),
          },
        ]}
      />
    </Panel>
  );
}
