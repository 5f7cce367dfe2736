import "server-only";
import { settings } from "@/lib/env";
import { timeText } from "@/lib/ui";
import { type Actor, may } from "@/modules/access";
import { identityMay, listPeople } from "@/modules/identity";
import { listLimitWorkbooks, measurementsMay } from "@/modules/measurements";
import { listIncidents, qualityMay } from "@/modules/quality";
import type { WaitingItem } from "@/modules/rounds/ui/waiting-list";
import { listWaitingVolumes, systemsMay } from "@/modules/systems";
import { askPage } from "./session";

/** What waits beside the day sheets: decided by this person, or made by them and waiting for another. */
export type Waiting = { decisions: WaitingItem[]; own: WaitingItem[] };

const when = (at: number): string => timeText(at, settings().STILLWELL_ZONE, "day-time");
type NameOf = (personId: number) => string;

async function limitsWaiting(actor: Actor, nameOf: NameOf): Promise<Waiting> {
  if (!may(actor, measurementsMay.read)) return { decisions: [], own: [] };
  const books = await askPage(listLimitWorkbooks, { state: "proposed" });
  const toItem = (book: (typeof books)[number], says: string): WaitingItem => ({
    href: `/setup/limits/workbooks/${book.id}`,
    label: `Limits: ${book.title}`,
    says,
  });
  const ours = books.filter((book) => book.proposedBy === actor.personId);
  const theirs = books.filter((book) => book.proposedBy !== actor.personId);
  return {
    decisions: may(actor, measurementsMay.approveLimits)
      ? theirs.map((book) =>
          toItem(book, `Proposed by ${nameOf(book.proposedBy)}, ${when(book.proposedAt)}. Waits for a lead.`),
        )
      : [],
    own: ours.map((book) =>
      toItem(book, `You proposed them ${when(book.proposedAt)}. Another lead decides.`),
    ),
  };
}

async function volumesWaiting(actor: Actor, nameOf: NameOf): Promise<Waiting> {
  if (!may(actor, systemsMay.read)) return { decisions: [], own: [] };
  const volumes = await askPage(listWaitingVolumes, {});
  const toItem = (volume: (typeof volumes)[number], says: string): WaitingItem => ({
    href: `/systems/${volume.systemCode}/volume`,
    label: `Volume of ${volume.systemCode}, ${volume.systemName}`,
    says,
  });
  const isOurs = (volume: (typeof volumes)[number]) => volume.proposedById === actor.personId;
  return {
    decisions: may(actor, systemsMay.approveVolume)
      ? volumes
          .filter((volume) => !isOurs(volume))
          .map((volume) =>
            toItem(
              volume,
              `Proposed by ${nameOf(volume.proposedById)}, ${when(volume.proposedAt)}. Waits for a lead.`,
            ),
          )
      : [],
    own: volumes
      .filter(isOurs)
      .map((volume) => toItem(volume, `You proposed it ${when(volume.proposedAt)}. A lead decides.`)),
  };
}

async function rolesWaiting(actor: Actor): Promise<Waiting> {
  if (!may(actor, identityMay.grantRoles)) return { decisions: [], own: [] };
  const people = await askPage(listPeople, {});
  const grants = people.flatMap((person) => person.waitingRoles.map((grant) => ({ person, grant })));
  const isOurs = ({ person, grant }: (typeof grants)[number]) =>
    person.id === actor.personId || grant.grantedBy === actor.personId;
  const toItem = ({ person, grant }: (typeof grants)[number], says: string): WaitingItem => ({
    href: `/setup/people/${person.id}`,
    label: `Role ${grant.role} for ${person.name}`,
    says,
  });
  return {
    decisions: grants
      .filter((one) => !isOurs(one))
      .map((one) => toItem(one, "Waits for a second administrator.")),
    own: grants.filter(isOurs).map((one) => toItem(one, "Another administrator decides on it.")),
  };
}

async function incidentsWaiting(actor: Actor): Promise<Waiting> {
  if (!may(actor, qualityMay.read)) return { decisions: [], own: [] };
  const rows = await askPage(listIncidents, {});
  const toItem = (row: (typeof rows)[number], says: string): WaitingItem => ({
    href: `/incidents/${row.id}`,
    label: `Incident ${row.code}: ${row.title}`,
    says,
  });
  const due = (row: (typeof rows)[number]) =>
    row.recheckDueAt === null ? "No recheck is set." : `Recheck due ${when(row.recheckDueAt)}.`;
  return {
    decisions: may(actor, qualityMay.close)
      ? rows
          .filter((row) => row.state === "rechecked")
          .map((row) =>
            toItem(row, `${row.systemCode}: the recheck was within. Waits for a lead to close it.`),
          )
      : [],
    own: rows
      .filter((row) => row.state === "open" && row.ownerId === actor.personId)
      .map((row) => toItem(row, `${row.systemCode}: it is yours. ${due(row)}`)),
  };
}

/** Everything that waits for this person's decision, and what of theirs waits for another or for themselves. */
export async function waitingFor(actor: Actor, names: Readonly<Record<number, string>>): Promise<Waiting> {
  const nameOf: NameOf = (personId) => names[personId] ?? `person ${personId}`;
  const parts = [
    await limitsWaiting(actor, nameOf),
    await volumesWaiting(actor, nameOf),
    await rolesWaiting(actor),
    await incidentsWaiting(actor),
  ];
  return { decisions: parts.flatMap((part) => part.decisions), own: parts.flatMap((part) => part.own) };
}
