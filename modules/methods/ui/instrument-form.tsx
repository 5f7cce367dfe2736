"use client";
import { useWatch } from "react-hook-form";
import { Field, FormDialog, Select, sendCommand, TextInput, useProblemForm } from "@/lib/ui";
import { createInstrumentInput, editInstrumentInput } from "../input";
import { INSTRUMENT_STATE_WORDS, INSTRUMENT_STATES, type InstrumentRow } from "../model";
import { capital } from "./options";

type Done = { onClose: () => void; onDone: (text: string, code: string) => void };

const HINTS = {
  scale: "What its marks mean. A refractometer: seawater or brine, which do not read alike.",
  checkEveryDays: "Calendar days from one check to the next. Empty: no date is asked for.",
} as const;

/** A new instrument: one device by its serial number. */
export function NewInstrumentForm({ onClose, onDone }: Done) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: createInstrumentInput,
    defaultValues: { code: "", name: "", serial: "", principle: "", scale: "", checkEveryDays: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand("/api/v1/instruments", values, { idempotencyKey });
      onDone(`Instrument ${values.code} is set up.`, values.code);
    },
  });
  return (
    <FormDialog
      title="New instrument"
      act="Set up the instrument"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field label="Code" name="code" required error={errorOf("code")} hint="As its label says: REF-02.">
        <TextInput {...form.register("code")} />
      </Field>
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
      <Field label="Serial number" name="serial" required error={errorOf("serial")}>
        <TextInput {...form.register("serial")} />
      </Field>
      <Field label="Principle" name="principle" required error={errorOf("principle")} hint="How it measures.">
        <TextInput {...form.register("principle")} />
      </Field>
      <Field label="Scale" name="scale" error={errorOf("scale")} hint={HINTS.scale}>
        <TextInput {...form.register("scale")} />
      </Field>
      <Field
        label="Check every (days)"
        name="checkEveryDays"
        error={errorOf("checkEveryDays")}
        hint={HINTS.checkEveryDays}
      >
        <TextInput inputMode="numeric" {...form.register("checkEveryDays")} />
      </Field>
    </FormDialog>
  );
}

const STATES = INSTRUMENT_STATES.map((value) => ({ value, label: capital(INSTRUMENT_STATE_WORDS[value]) }));

/** Changes to an instrument, its state among them; its code stays. */
export function EditInstrumentForm({ instrument, onClose, onDone }: Done & { instrument: InstrumentRow }) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: editInstrumentInput,
    defaultValues: {
      instrumentId: instrument.id,
      name: instrument.name,
      serial: instrument.serial,
      principle: instrument.principle,
      scale: instrument.scale ?? "",
      checkEveryDays: String(instrument.checkEveryDays ?? ""),
      state: instrument.state,
      retiredReason: "",
    },
    send: async ({ instrumentId, ...values }, idempotencyKey) => {
      await sendCommand(`/api/v1/instruments/${instrumentId}`, values, { idempotencyKey, method: "PUT" });
      onDone(`Instrument ${instrument.code} is changed.`, instrument.code);
    },
  });
  const state = useWatch({ control: form.control, name: "state" });
  return (
    <FormDialog
      title={`Instrument ${instrument.code}`}
      act="Save the instrument"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
      <Field label="Serial number" name="serial" required error={errorOf("serial")}>
        <TextInput {...form.register("serial")} />
      </Field>
      <Field label="Principle" name="principle" required error={errorOf("principle")}>
        <TextInput {...form.register("principle")} />
      </Field>
      <Field label="Scale" name="scale" error={errorOf("scale")} hint={HINTS.scale}>
        <TextInput {...form.register("scale")} />
      </Field>
      <Field
        label="Check every (days)"
        name="checkEveryDays"
        error={errorOf("checkEveryDays")}
        hint={HINTS.checkEveryDays}
      >
        <TextInput inputMode="numeric" {...form.register("checkEveryDays")} />
      </Field>
      <Field label="State" name="state" required error={errorOf("state")}>
        <Select options={STATES} {...form.register("state")} />
      </Field>
      {state === "retired" && (
        <Field
          label="Why it is retired"
          name="retiredReason"
          required
          error={errorOf("retiredReason")}
          hint="It keeps its checks and readings, and does not come back."
        >
          <TextInput {...form.register("retiredReason")} />
        </Field>
      )}
    </FormDialog>
  );
}
