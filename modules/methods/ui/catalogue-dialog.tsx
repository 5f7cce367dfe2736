"use client";
import { useState } from "react";
import { Button, Checkbox, Dialog, FormError, useAct } from "@/lib/ui";
import { PARAMETER_GROUP_WORDS, PARAMETER_GROUPS, type ParameterDefinition } from "../model";

export interface CatalogueDialogProps {
  missing: readonly ParameterDefinition[];
  onClose: () => void;
}

/** The entries of the starter catalogue that are not there yet: all of them, or some. */
export function CatalogueDialog({ missing, onClose }: CatalogueDialogProps) {
  const [picked, setPicked] = useState(() => new Set(missing.map((entry) => entry.code)));
  const { act, busy, problem } = useAct();
  const toggle = (code: string, on: boolean) => {
    const next = new Set(picked);
    if (on) next.add(code);
    else next.delete(code);
    setPicked(next);
  };
  const count = picked.size === 1 ? "1 parameter" : `${picked.size} parameters`;
  return (
    <Dialog
      open
      onClose={onClose}
      title="Add from the starter catalogue"
      width="wide"
      actions={
        <>
          <Button
            variant="next"
            busy={busy}
            busyText="Adding"
            disabled={picked.size === 0}
            onClick={() =>
              void act(
                "/api/v1/parameters/catalogue",
                { codes: [...picked] },
                { done: `${count} added.`, then: onClose },
              )
            }
          >
            Add {count}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </>
      }
    >
      <FormError problem={problem} />
      <p className="text-ink-2">
        What marine work commonly measures and checks. Everything but code, kind and unit can be changed
        afterwards.
      </p>
      <div className="my-3 flex flex-wrap gap-2.5">
        <Button size="small" onClick={() => setPicked(new Set(missing.map((entry) => entry.code)))}>
          Tick all
        </Button>
        <Button size="small" onClick={() => setPicked(new Set())}>
          Tick none
        </Button>
      </div>
      {PARAMETER_GROUPS.map((group) => {
        const entries = missing.filter((entry) => entry.group === group);
        if (entries.length === 0) return null;
        return (
          <fieldset key={group} className="mt-4">
            <legend className="font-semibold">{PARAMETER_GROUP_WORDS[group]}</legend>
            <div className="grid gap-x-6 sm:grid-cols-2">
              {entries.map((entry) => (
                <Checkbox
                  key={entry.code}
                  label={entry.name}
                  hint={entry.unit ?? undefined}
                  checked={picked.has(entry.code)}
                  onChange={(event) => toggle(entry.code, event.target.checked)}
                />
              ))}
            </div>
          </fieldset>
        );
      })}
    </Dialog>
  );
}
