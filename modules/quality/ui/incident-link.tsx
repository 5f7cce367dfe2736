"use client";
import { useQuery, useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { useState } from "react";
import { Button, fetchJson, useAct } from "@/lib/ui";
import type { IncidentRow } from "../model";
import { NewIncidentDialog } from "./new-incident-dialog";

/** What the server says of a reading and incidents. */
interface OfReading {
  joined: IncidentRow | null;
  open: IncidentRow | null;
  proposedTitle: string;
}

/**
 * Beside a reading that is off: the incident it belongs to, one press to join the open incident about the same trouble, or
 * the way to open one.
 */
export function IncidentLink({ readingId, mayHandle = true }: { readingId: number; mayHandle?: boolean }) {
  const key = ["incident-of-reading", readingId];
  const client = useQueryClient();
  const { act, busy } = useAct();
  const [opening, setOpening] = useState(false);
  const { data } = useQuery({
    queryKey: key,
    queryFn: async ({ signal }) => {
      const answer = await fetchJson<{ data: OfReading }>(`/api/v1/readings/${readingId}/incident`, signal);
      return answer.data;
    },
    retry: false,
  });
  if (!data) return null;
  const renew = () => void client.invalidateQueries({ queryKey: ["incident-of-reading"] });
  if (data.joined !== null) {
    return (
      <Link href={`/incidents/${data.joined.id}`} className="link inline-flex min-h-6 items-center">
        Incident {data.joined.code}: {data.joined.title}
      </Link>
    );
  }
  if (!mayHandle) return null;
  const { open } = data;
  if (open !== null) {
    return (
      <Button
        size="small"
        busy={busy}
        busyText="Joining …"
        onClick={() =>
          void act(
            `/api/v1/incidents/${open.id}/readings`,
            { readingId },
            { done: `Joined to incident ${open.code}.`, then: renew },
          )
        }
      >
        Join incident {open.code}: {open.title}
      </Button>
    );
  }
  return (
    <>
      <Button size="small" onClick={() => setOpening(true)}>
        Take up as an incident…
      </Button>
      {opening && (
        <NewIncidentDialog
          readingId={readingId}
          proposedTitle={data.proposedTitle}
          onClose={() => setOpening(false)}
          onDone={renew}
        />
      )}
    </>
  );
}
