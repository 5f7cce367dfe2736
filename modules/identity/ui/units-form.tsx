"use client";
import { useState } from "react";
import { Button, Field, Select, useAct } from "@/lib/ui";
import { acceptedUnits, unitLabel } from "@/lib/units/factors";
import { UNIT_DIMENSIONS } from "./unit-dimensions.data";

/** The units in which a person likes to read and type, by dimension; stored values do not change by it. */
export function UnitsForm({ preferred }: { preferred: Readonly<Record<string, string>> }) {
  const { act, busy } = useAct();
  const [units, setUnits] = useState<Record<string, string>>(preferred);
  function choose(dimension: string, code: string) {
    const { [dimension]: _former, ...others } = units;
    setUnits(code === "" ? others : { ...others, [dimension]: code });
  }
  return (
    <form
      className="grid gap-5"
      onSubmit={(event) => {
        event.preventDefault();
        void act("/api/v1/account/units", { units }, { method: "PUT", done: "Stored." });
      }}
    >
      <div className="grid gap-4 sm:grid-cols-2 xl:grid-cols-3">
        {UNIT_DIMENSIONS.map(({ dimension, label }) => (
          <Field key={dimension} label={label} name={`unit-${dimension}`} required>
            <Select
              placeholder="As each parameter is set up"
              options={acceptedUnits(dimension).map(({ code }) => ({ value: code, label: unitLabel(code) }))}
              value={units[dimension] ?? ""}
              onChange={(event) => choose(dimension, event.target.value)}
            />
          </Field>
        ))}
      </div>
      <div>
        <Button type="submit" busy={busy} busyText="Storing …">
          Store units
        </Button>
      </div>
    </form>
  );
}
