import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { PageHead } from "@/lib/ui";
import { epochToLocal } from "@/lib/zone";
import { may } from "@/modules/access";
import { identityMay, listDeputies, listPeople } from "@/modules/identity";
import { DeputiesTable } from "@/modules/identity/ui/deputies-table";
import { DeputyForm } from "@/modules/identity/ui/deputy-form";

export const metadata: Metadata = { title: "Deputies" };

export default async function DeputiesPage() {
  const [deputies, people] = [await askPage(listDeputies, {}), await askPage(listPeople, {})];
  const actor = await pageActor();
  const today = epochToLocal(systemClock.now(), settings().STILLWELL_ZONE).on;
  const nameOf = new Map(people.map((person) => [person.id, person.name]));
  const forOthers = actor.roles.includes("admin");
  const mayName = may(actor, identityMay.nameDeputies);
  const rows = deputies.map((row) => ({
    id: row.id,
    role: row.role,
    fromOn: row.fromOn,
    toOn: row.toOn,
    person: nameOf.get(row.personId) ?? "",
    deputy: nameOf.get(row.deputyId) ?? "",
    mayEnd: mayName && (forOthers || row.personId === actor.personId),
  }));
  const active = people.filter((person) => person.state === "active");
  const holders = active.filter(
    (person) => person.roles.length > 0 && (forOthers || person.id === actor.personId),
  );
  return (
    <>
      <PageHead
        title="Deputies"
        facts="Somebody stands in for somebody in one role, for as long as the other holds it. Own work stays own work: a deputy does not approve what they made."
      />
      <DeputiesTable rows={rows} today={today} />
      {mayName && holders.length > 0 && (
        <DeputyForm
          holders={holders.map(({ id, name, roles }) => ({ id, name, roles }))}
          people={active.filter(({ id }) => id !== actor.personId).map(({ id, name }) => ({ id, name }))}
          today={today}
        />
      )}
    </>
  );
}
