"use client";
import { useState } from "react";
import { Button, Panel, useAct } from "@/lib/ui";
import type { PersonRow } from "../model";
import { ReasonDialog } from "./reason-dialog";

export interface AccessPanelProps {
  person: PersonRow;
  viewerId: number;
}

const SAYS: Record<PersonRow["state"], string> = {
  invited: "Has been invited and has not chosen a password yet. An invitation works once, for seven days.",
  active: "Can sign in.",
  suspended: "Is shut out: no session of theirs works.",
};

/** Whether a person can come in: invite again, shut out, let back in. */
export function AccessPanel({ person, viewerId }: AccessPanelProps) {
  const { act, busy } = useAct();
  const [asking, setAsking] = useState(false);
  const path = `/api/v1/people/${person.id}`;
  return (
    <Panel title="Coming in">
      <p>{SAYS[person.state]}</p>
      {person.suspendedReason !== null && <p className="mt-1 text-ink-2">Reason: {person.suspendedReason}</p>}
      {person.id === viewerId && (
        <p className="mt-1 text-ink-2">This is you. Only another administrator can shut you out.</p>
      )}
      <div className="mt-4 flex flex-wrap gap-2.5 empty:hidden">
        {person.state === "invited" && (
          <Button
            busy={busy}
            onClick={() =>
              void act(
                `${path}/invitation`,
                {},
                { done: "A new invitation is on its way; the old link is void." },
              )
            }
          >
            Invite again
          </Button>
        )}
        {person.state === "suspended" && (
          <Button
            variant="next"
            busy={busy}
            onClick={() =>
              void act(`${path}/reinstatement`, {}, { done: `${person.name} can come in again.` })
            }
          >
            Let back in
          </Button>
        )}
        {person.state !== "suspended" && person.id !== viewerId && (
          <Button variant="danger" onClick={() => setAsking(true)}>
            Suspend
          </Button>
        )}
      </div>
      {asking && (
        <ReasonDialog
          open
          title={`Suspend ${person.name}?`}
          actText="Suspend"
          busy={busy}
          onClose={() => setAsking(false)}
          onAct={(reason) =>
            void act(
              `${path}/suspension`,
              { reason },
              { done: `${person.name} is shut out.`, then: () => setAsking(false) },
            )
          }
        >
          <p>
            Their sessions end at once and they cannot sign in. Their records, reviews and signatures stay.
          </p>
        </ReasonDialog>
      )}
    </Panel>
  );
}
