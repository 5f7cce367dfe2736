"use client";
import {
  Checkbox,
  Field,
  FormDialog,
  Select,
  sendCommand,
  Textarea,
  TextInput,
  useProblemForm,
} from "@/lib/ui";
import { createMethodInput, editMethodInput } from "../input";
import type { FacilityParameter, MethodRow } from "../model";
import { parameterOptions } from "./options";

type Done = { onClose: () => void; onDone: (text: string) => void };

/** A new method of measuring a parameter. */
export function NewMethodForm({ parameters, onClose, onDone }: Done & { parameters: FacilityParameter[] }) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: createMethodInput,
    defaultValues: { code: "", name: "", parameterId: "", principle: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand("/api/v1/methods", values, { idempotencyKey });
      onDone(`Method ${values.code} is set up.`);
    },
  });
  return (
    <FormDialog
      title="New method"
      act="Set up the method"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field label="Code" name="code" required error={errorOf("code")} hint="Short, as people say it: M-12.">
        <TextInput {...form.register("code")} />
      </Field>
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
      <Field label="Measures" name="parameterId" required error={errorOf("parameterId")}>
        <Select
          placeholder="Choose a parameter"
          options={parameterOptions(parameters)}
          {...form.register("parameterId")}
        />
      </Field>
      <Field
        label="Principle"
        name="principle"
        required
        error={errorOf("principle")}
        hint="How it measures, and where the written procedure lies."
      >
        <Textarea rows={3} {...form.register("principle")} />
      </Field>
    </FormDialog>
  );
}

/** Changes to a method; its code and its parameter stay. */
export function EditMethodForm({ method, onClose, onDone }: Done & { method: MethodRow }) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: editMethodInput,
    defaultValues: {
      methodId: method.id,
      name: method.name,
      principle: method.principle,
      isRetired: method.isRetired,
    },
    send: async ({ methodId, ...values }, idempotencyKey) => {
      await sendCommand(`/api/v1/methods/${methodId}`, values, { idempotencyKey, method: "PUT" });
      onDone(`Method ${method.code} is changed.`);
    },
  });
  return (
    <FormDialog
      title={`Method ${method.code}`}
      act="Save the method"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <p className="text-ink-2">Measures {method.parameterName}.</p>
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
      <Field label="Principle" name="principle" required error={errorOf("principle")}>
        <Textarea rows={3} {...form.register("principle")} />
      </Field>
      <Checkbox
        label="Retired"
        hint="Its readings keep naming it; it is no longer offered."
        {...form.register("isRetired")}
      />
    </FormDialog>
  );
}
