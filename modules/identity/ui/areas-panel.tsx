"use client";
import { useState } from "react";
import { Button, Panel, useAct } from "@/lib/ui";
import type { PersonRow } from "../model";
import { PickMany } from "./pick-many";

export interface AreasPanelProps {
  person: PersonRow;
  areas: readonly { id: number; name: string }[];
  mayManage: boolean;
}

/** In which areas a person works. */
export function AreasPanel({ person, areas, mayManage }: AreasPanelProps) {
  const { act, busy } = useAct();
  const [chosen, setChosen] = useState(person.areaIds);
  const nameOf = (id: number) => areas.find((area) => area.id === id)?.name ?? `area ${id}`;
  if (areas.length === 0) {
    return (
      <Panel title="Areas">
        <p className="text-ink-2">
          There are no areas yet. Once there are, say here in which an aquarist works.
        </p>
      </Panel>
    );
  }
  if (!mayManage) {
    return (
      <Panel title="Areas">
        <p>{person.areaIds.length === 0 ? "All areas." : person.areaIds.map(nameOf).join(", ")}</p>
      </Panel>
    );
  }
  return (
    <Panel title="Areas">
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          const options = { method: "PUT", done: "Stored." } as const;
          void act(`/api/v1/people/${person.id}/areas`, { areaIds: chosen }, options);
        }}
      >
        <PickMany
          label="Works in"
          hint="With none chosen: in all of them. Only an aquarist's work is bound to areas."
          options={areas.map((area) => ({ value: area.id, label: area.name }))}
          value={chosen}
          onChange={setChosen}
        />
        <div>
          <Button type="submit" busy={busy} busyText="Storing …">
            Store areas
          </Button>
        </div>
      </form>
    </Panel>
  );
}
