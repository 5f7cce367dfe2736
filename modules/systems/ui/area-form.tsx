"use client";
import { Field, FormDialog, Select, sendCommand, TextInput, useProblemForm } from "@/lib/ui";
import { areaFormInput, createSiteInput } from "../input";
import { type AreaRow, BIOSECURITY_LEVELS } from "../model";

type Done = { onClose: () => void; onDone: (text: string) => void };

/** Sets up the site that areas belong to. */
export function SiteForm({ onClose, onDone }: Done) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: createSiteInput,
    defaultValues: { code: "", name: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand("/api/v1/sites", values, { idempotencyKey });
      onDone(`Site ${values.code} is set up.`);
    },
  });
  return (
    <FormDialog
      title="New site"
      act="Set up the site"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field label="Code" name="code" required error={errorOf("code")} hint="Short, as people say it: MAIN.">
        <TextInput {...form.register("code")} />
      </Field>
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
    </FormDialog>
  );
}

const LEVEL_OPTIONS = BIOSECURITY_LEVELS.map((level) => ({ value: String(level), label: String(level) }));

/** A new area, or changes to one. */
export function AreaForm({ area, onClose, onDone }: Done & { area: AreaRow | null }) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: areaFormInput,
    defaultValues: {
      code: area?.code ?? "",
      name: area?.name ?? "",
      biosecurityLevel: String(area?.biosecurityLevel ?? 0),
      walkingOrder: String(area?.walkingOrder ?? ""),
    },
    send: async (values, idempotencyKey) => {
      if (area) await sendCommand(`/api/v1/areas/${area.id}`, values, { idempotencyKey, method: "PUT" });
      else await sendCommand("/api/v1/areas", values, { idempotencyKey });
      onDone(area ? `Area ${values.code} is changed.` : `Area ${values.code} is set up.`);
    },
  });
  return (
    <FormDialog
      title={area ? `Area ${area.code}` : "New area"}
      act={area ? "Save the area" : "Set up the area"}
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field label="Code" name="code" required error={errorOf("code")} hint="Short, as people say it: REEF.">
        <TextInput {...form.register("code")} />
      </Field>
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
      <Field
        label="Biosecurity level"
        name="biosecurityLevel"
        required
        error={errorOf("biosecurityLevel")}
        hint="0: no restriction beyond clean hands; 4: strict isolation. Your facility's procedures say what each level asks for."
      >
        <Select options={LEVEL_OPTIONS} {...form.register("biosecurityLevel")} />
      </Field>
      <Field
        label="Walking order"
        name="walkingOrder"
        required
        error={errorOf("walkingOrder")}
        hint="Rounds go from low to high. Leave gaps (10, 20, 30) for areas to come."
      >
        <TextInput inputMode="numeric" {...form.register("walkingOrder")} />
      </Field>
    </FormDialog>
  );
}
