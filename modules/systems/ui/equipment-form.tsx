"use client";
import { Field, FormDialog, Select, sendCommand, Textarea, TextInput, useProblemForm } from "@/lib/ui";
import { equipmentFormInput } from "../input";
import {
  EQUIPMENT_KIND_WORDS,
  EQUIPMENT_KINDS,
  type EquipmentRow,
  SYSTEM_STATE_WORDS,
  SYSTEM_STATES,
  type SystemRow,
} from "../model";
import { wordOptions } from "./options";

type EquipmentFormProps = {
  system: SystemRow;
  equipment: EquipmentRow | null;
  onClose: () => void;
  onDone: (text: string) => void;
};

/** New equipment of a system, or changes to it. */
export function EquipmentForm({ system, equipment, onClose, onDone }: EquipmentFormProps) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: equipmentFormInput,
    defaultValues: {
      code: equipment?.code ?? "",
      name: equipment?.name ?? "",
      kind: equipment?.kind ?? "pump",
      state: equipment?.state ?? "in-service",
      notes: equipment?.notes ?? "",
    },
    send: async (values, idempotencyKey) => {
      if (equipment) {
        await sendCommand(`/api/v1/equipment/${equipment.id}`, values, { idempotencyKey, method: "PUT" });
      } else {
        await sendCommand("/api/v1/equipment", { ...values, systemId: system.id }, { idempotencyKey });
      }
      onDone(`${values.code} of ${system.code} is ${equipment ? "changed" : "added"}.`);
    },
  });
  return (
    <FormDialog
      title={equipment ? `${equipment.code} of ${system.code}` : `New equipment of ${system.code}`}
      act={equipment ? "Save the equipment" : "Add the equipment"}
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field
        label="Code"
        name="code"
        required
        error={errorOf("code")}
        hint="As it is labelled in the plant room: P-1."
      >
        <TextInput {...form.register("code")} />
      </Field>
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
      <Field label="Kind" name="kind" required error={errorOf("kind")}>
        <Select options={wordOptions(EQUIPMENT_KINDS, EQUIPMENT_KIND_WORDS)} {...form.register("kind")} />
      </Field>
      <Field label="State" name="state" required error={errorOf("state")}>
        <Select options={wordOptions(SYSTEM_STATES, SYSTEM_STATE_WORDS)} {...form.register("state")} />
      </Field>
      <Field label="Notes" name="notes" error={errorOf("notes")}>
        <Textarea {...form.register("notes")} />
      </Field>
    </FormDialog>
  );
}
