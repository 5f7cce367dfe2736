"use client";
import { useState } from "react";
import { DateInput, Field } from "@/lib/ui";
import { localToEpoch } from "@/lib/zone";

type EffectiveFromFieldProps = {
  zone: string;
  /** The moment in UTC ms; null for the moment of proposal; undefined while what is typed is no moment. */
  onChange: (at: number | null | undefined) => void;
  showAll: boolean;
};

/** From when a volume counts, in the facility's time. Left empty, from the moment it is proposed. */
export function EffectiveFromField({ zone, onChange, showAll }: EffectiveFromFieldProps) {
  const [text, setText] = useState("");
  const moment = momentOf(text, zone);
  return (
    <Field
      label="Counts from"
      name="effectiveFromAt"
      hint={`Facility time (${zone}). Left empty: from now. It counts only once it is approved.`}
      error={
        moment === undefined && (showAll || text.length >= 16)
          ? "The clock never showed this time: choose another."
          : undefined
      }
    >
      <DateInput
        kind="datetime-local"
        value={text}
        onChange={(event) => {
          setText(event.target.value);
          onChange(momentOf(event.target.value, zone));
        }}
      />
    </Field>
  );
}

/** Of an hour that the clock showed twice, the earlier one: the volume then counts for both. */
function momentOf(text: string, zone: string): number | null | undefined {
  if (text === "") return null;
  const [on = "", at = ""] = text.split("T");
  try {
    const reading = localToEpoch({ on, at, zone, disambiguation: "earlier" });
    return reading.kind === "one" ? reading.epochMs : undefined;
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}
