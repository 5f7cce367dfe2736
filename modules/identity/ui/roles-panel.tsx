"use client";
import { useState } from "react";
import { Button, ButtonRow, Field, Panel, Select, useAct } from "@/lib/ui";
import type { Role } from "@/modules/access";
import type { PersonRow } from "../model";
import { ReasonDialog } from "./reason-dialog";
import { ROLE_OPTIONS, roleText } from "./role-words";

export interface RolesPanelProps {
  person: PersonRow;
  /** Who looks at it; a role given to oneself is for another to decide on. */
  viewerId: number;
  mayGrant: boolean;
}

/** The roles of a person: held, waiting for a second administrator, and those that can be given. */
export function RolesPanel({ person, viewerId, mayGrant }: RolesPanelProps) {
  const { act, busy } = useAct();
  const [ending, setEnding] = useState<Role | null>(null);
  const held = new Set([...person.roles, ...person.waitingRoles.map((one) => one.role)]);
  const free = ROLE_OPTIONS.filter((option) => !held.has(option.value));
  const path = `/api/v1/people/${person.id}/roles`;
  return (
    <Panel title="Roles" id="roles">
      <ul className="divide-y divide-rule">
        {person.roles.map((role) => (
          <li key={role} className="flex flex-wrap items-center gap-3 py-2">
            <span className="grow font-semibold">{roleText(role)}</span>
            {mayGrant && (
              <Button
                size="small"
                onClick={() => setEnding(role)}
                aria-label={`End the role ${roleText(role)}`}
              >
                End
              </Button>
            )}
          </li>
        ))}
        {person.waitingRoles.map((waiting) => (
          <WaitingRole
            key={waiting.grantId}
            waiting={waiting}
            mayDecide={mayGrant && viewerId !== waiting.grantedBy && viewerId !== person.id}
          />
        ))}
        {held.size === 0 && (
          <li className="py-2 text-ink-2">No role: this person can sign in and see their account.</li>
        )}
      </ul>
      {mayGrant && free.length > 0 && (
        <GrantForm
          options={free}
          isOwn={viewerId === person.id}
          busy={busy}
          onGrant={(role) => act(path, { role }, { done: `${roleText(role)}: given.` })}
        />
      )}
      {ending !== null && (
        <ReasonDialog
          open
          title={`End the role ${roleText(ending)}?`}
          actText="End the role"
          busy={busy}
          onClose={() => setEnding(null)}
          onAct={(reason) =>
            void act(
              `${path}/end`,
              { role: ending, reason },
              { done: "The role has ended.", then: () => setEnding(null) },
            )
          }
        >
          <p>
            {person.name} may do nothing by this role from the very next request on. What they did stays
            theirs.
          </p>
        </ReasonDialog>
      )}
    </Panel>
  );
}

function WaitingRole({
  waiting,
  mayDecide,
}: {
  waiting: PersonRow["waitingRoles"][number];
  mayDecide: boolean;
}) {
  const { act, busy } = useAct();
  const path = `/api/v1/roles/${waiting.grantId}/decision`;
  return (
    <li className="grid gap-2 py-2">
      <span>
        <b className="font-semibold">{roleText(waiting.role)}</b>{" "}
        <span className="font-semibold text-watch">waits for a second administrator</span>
        <span className="block text-ink-2">
          {mayDecide
            ? "This person gave it to themselves; it works once you approve it."
            : "Whoever gives a role to themselves does not decide on it: another administrator does."}
        </span>
      </span>
      {mayDecide && (
        <ButtonRow>
          <Button
            size="small"
            variant="next"
            busy={busy}
            onClick={() => void act(path, { decision: "approve" }, { done: "Approved: the role works now." })}
          >
            Approve
          </Button>
          <Button
            size="small"
            busy={busy}
            onClick={() => void act(path, { decision: "refuse" }, { done: "Refused." })}
          >
            Refuse
          </Button>
        </ButtonRow>
      )}
    </li>
  );
}

interface GrantFormProps {
  options: readonly { value: Role; label: string }[];
  isOwn: boolean;
  busy: boolean;
  onGrant: (role: Role) => Promise<boolean>;
}

function GrantForm({ options, isOwn, busy, onGrant }: GrantFormProps) {
  const [role, setRole] = useState<Role | "">("");
  return (
    <form
      className="mt-4 flex flex-wrap items-end gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        if (role !== "") void onGrant(role).then((given) => given && setRole(""));
      }}
    >
      <Field label="Give a role" name="role" required className="min-w-56 grow">
        <Select
          placeholder="Choose a role"
          options={options}
          value={role}
          onChange={(event) => setRole(event.target.value as Role | "")}
          required
        />
      </Field>
      <Button type="submit" busy={busy} busyText="Giving …">
        Give
      </Button>
      {isOwn && (
        <p className="basis-full text-sm text-ink-3">
          A role for yourself works once another administrator has approved it.
        </p>
      )}
    </form>
  );
}
