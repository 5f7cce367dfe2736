import Link from "next/link";
import { type DataColumn, DataTable, EmptyState } from "@/lib/ui";
import type { PersonRow } from "../model";
import { roleText, STATE_WORDS } from "./role-words";

export interface PeopleTableProps {
  people: readonly PersonRow[];
  areaNames: Readonly<Record<number, string>>;
}

function Roles({ person }: { person: PersonRow }) {
  if (person.roles.length + person.waitingRoles.length === 0) return <span className="text-ink-3">none</span>;
  return (
    <>
      {person.roles.map(roleText).join(", ")}
      {person.waitingRoles.map(({ grantId, role }) => (
        <span key={grantId} className="block font-semibold text-watch">
          {roleText(role)}: waits for a second administrator
        </span>
      ))}
    </>
  );
}

/** Everybody, with roles, areas and whether they can come in. */
export function PeopleTable({ people, areaNames }: PeopleTableProps) {
  const columns: DataColumn<PersonRow>[] = [
    {
      id: "name",
      head: "Name",
      rowHead: true,
      cell: (person) => (
        <Link href={`/setup/people/${person.id}`} className="link inline-flex min-h-6">
          {person.name}
        </Link>
      ),
    },
    { id: "roles", head: "Roles", cell: (person) => <Roles person={person} /> },
    {
      id: "areas",
      head: "Areas",
      wideOnly: true,
      cell: (person) =>
        person.areaIds.length === 0
          ? "all"
          : person.areaIds.map((id) => areaNames[id] ?? `area ${id}`).join(", "),
    },
    {
      id: "state",
      head: "State",
      cell: (person) => (
        <span className={person.state === "active" ? "" : "font-semibold text-watch"}>
          {STATE_WORDS[person.state]}
        </span>
      ),
    },
    { id: "email", head: "E-mail address", wideOnly: true, cell: (person) => person.email },
  ];
  return (
    <DataTable
      caption="People"
      columns={columns}
      rows={people}
      rowKey={(person) => person.id}
      empty={
        <EmptyState title="Nobody yet">
          <p>People stand here once an administrator has invited them.</p>
        </EmptyState>
      }
    />
  );
}
