import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { LinkButton, PageHead } from "@/lib/ui";
import { may } from "@/modules/access";
import { identityMay, listPeople } from "@/modules/identity";
import { PeopleTable } from "@/modules/identity/ui/people-table";
import { listAreas } from "@/modules/systems";

export const metadata: Metadata = { title: "People" };

export default async function PeoplePage() {
  const people = await askPage(listPeople, {});
  const [actor, areas] = [await pageActor(), await askPage(listAreas, {})];
  const waiting = people
    .flatMap((person) => person.waitingRoles.map((role) => ({ ...role, person })))
    .filter((role) => role.grantedBy !== actor.personId && role.person.id !== actor.personId).length;
  const maySetUp = may(actor, identityMay.managePeople);
  return (
    <>
      <PageHead
        title="People"
        facts="Everybody who has a place in these records. Nobody is deleted: whoever leaves is suspended."
        waiting={
          maySetUp && waiting > 0
            ? `${waiting === 1 ? "A role waits" : `${waiting} roles wait`} for a second administrator.`
            : undefined
        }
        actions={
          maySetUp ? (
            <LinkButton href="/setup/people/invite" variant="next">
              Invite somebody
            </LinkButton>
          ) : undefined
        }
      />
      <PeopleTable
        people={people}
        areaNames={Object.fromEntries(areas.map((area) => [area.id, area.name]))}
      />
    </>
  );
}
