"use client";
import { Field, FormDialog, Select, sendCommand, Textarea, TextInput, useProblemForm } from "@/lib/ui";
import { reasonFormInput, systemFormInput } from "../input";
import {
  type AreaRow,
  SYSTEM_KIND_WORDS,
  SYSTEM_KINDS,
  SYSTEM_STATE_WORDS,
  type SystemRow,
  WATER_TYPE_WORDS,
  WATER_TYPES,
} from "../model";
import { wordOptions } from "./options";

const WORKING_STATES = ["in-service", "out-of-service"] as const;

type SystemFormProps = {
  system: SystemRow | null;
  areas: readonly AreaRow[];
  onClose: () => void;
  onDone: (text: string, code: string) => void;
};

/** A new system, or changes to one that is not retired. */
export function SystemForm({ system, areas, onClose, onDone }: SystemFormProps) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: systemFormInput,
    defaultValues: {
      code: system?.code ?? "",
      name: system?.name ?? "",
      areaId: String(system?.areaId ?? (areas.length === 1 ? areas[0]?.id : "")),
      kind: system?.kind ?? "exhibit",
      waterType: system?.waterType ?? "seawater",
      state: system?.state === "out-of-service" ? "out-of-service" : "in-service",
      walkingOrder: String(system?.walkingOrder ?? ""),
      notes: system?.notes ?? "",
    },
    send: async (values, idempotencyKey) => {
      if (system)
        await sendCommand(`/api/v1/systems/${system.id}`, values, { idempotencyKey, method: "PUT" });
      else await sendCommand("/api/v1/systems", values, { idempotencyKey });
      onDone(
        system ? `${values.code} is changed.` : `${values.code} is set up, with a point at its surface.`,
        values.code,
      );
    },
  });
  return (
    <FormDialog
      title={system ? `System ${system.code}` : "New system"}
      act={system ? "Save the system" : "Set up the system"}
      wide
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          label="Code"
          name="code"
          required
          error={errorOf("code")}
          hint="As it is written on the tank: KELP-01."
        >
          <TextInput {...form.register("code")} />
        </Field>
        <Field label="Name" name="name" required error={errorOf("name")}>
          <TextInput {...form.register("name")} />
        </Field>
        <Field label="Area" name="areaId" required error={errorOf("areaId")}>
          <Select
            placeholder="Choose an area"
            options={areas.map((area) => ({ value: String(area.id), label: `${area.code} · ${area.name}` }))}
            {...form.register("areaId")}
          />
        </Field>
        <Field label="Walking order in its area" name="walkingOrder" required error={errorOf("walkingOrder")}>
          <TextInput inputMode="numeric" {...form.register("walkingOrder")} />
        </Field>
        <Field label="Kind" name="kind" required error={errorOf("kind")}>
          <Select options={wordOptions(SYSTEM_KINDS, SYSTEM_KIND_WORDS)} {...form.register("kind")} />
        </Field>
        <Field label="Water" name="waterType" required error={errorOf("waterType")}>
          <Select options={wordOptions(WATER_TYPES, WATER_TYPE_WORDS)} {...form.register("waterType")} />
        </Field>
        <Field label="State" name="state" required error={errorOf("state")}>
          <Select options={wordOptions(WORKING_STATES, SYSTEM_STATE_WORDS)} {...form.register("state")} />
        </Field>
      </div>
      <Field label="Notes" name="notes" error={errorOf("notes")}>
        <Textarea {...form.register("notes")} />
      </Field>
    </FormDialog>
  );
}

/** Asks why a system is retired; that cannot be taken back. */
export function RetireForm({
  system,
  onClose,
  onDone,
}: {
  system: SystemRow;
  onClose: () => void;
  onDone: (text: string) => void;
}) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: reasonFormInput,
    defaultValues: { reason: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand(`/api/v1/systems/${system.id}/retire`, values, { idempotencyKey });
      onDone(`${system.code} is retired.`);
    },
  });
  return (
    <FormDialog
      title={`Retire ${system.code}`}
      act="Retire the system"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <p>
        {system.code} takes no more readings from now on and leaves every round. Its readings and its history
        stay. This cannot be taken back; to rest a system for a time, set it out of service instead.
      </p>
      <Field label="Reason" name="reason" required error={errorOf("reason")}>
        <Textarea {...form.register("reason")} />
      </Field>
    </FormDialog>
  );
}
