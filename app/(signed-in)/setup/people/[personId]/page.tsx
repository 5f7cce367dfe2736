import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { PageHead, Panel } from "@/lib/ui";
import { may } from "@/modules/access";
import { getPersonRow, identityMay } from "@/modules/identity";
import { AccessPanel } from "@/modules/identity/ui/access-panel";
import { AreasPanel } from "@/modules/identity/ui/areas-panel";
import { PersonForm } from "@/modules/identity/ui/person-form";
import { STATE_WORDS } from "@/modules/identity/ui/role-words";
import { RolesPanel } from "@/modules/identity/ui/roles-panel";
import { listAreas } from "@/modules/systems";

export const metadata: Metadata = { title: "Person" };

export default async function PersonPage({ params }: { params: Promise<{ personId: string }> }) {
  const person = await askPage(getPersonRow, { personId: (await params).personId });
  const [actor, areas] = [await pageActor(), await askPage(listAreas, {})];
  const maySetUp = may(actor, identityMay.managePeople);
  const viewerId = actor.personId ?? 0;
  // The forms keep what is typed; after a change by somebody else they begin anew.
  const version = JSON.stringify(person);
  return (
    <>
      <PageHead title={person.name} facts={`${person.email} · ${STATE_WORDS[person.state]}`} />
      <div className="grid items-start gap-5 lg:grid-cols-2">
        <RolesPanel person={person} viewerId={viewerId} mayGrant={may(actor, identityMay.grantRoles)} />
        <AreasPanel
          key={`areas ${version}`}
          person={person}
          areas={areas.map(({ id, name }) => ({ id, name }))}
          mayManage={maySetUp}
        />
        {maySetUp && (
          <Panel title="Name and address">
            <PersonForm key={`name ${version}`} person={person} />
          </Panel>
        )}
        {maySetUp && <AccessPanel person={person} viewerId={viewerId} />}
      </div>
    </>
  );
}
