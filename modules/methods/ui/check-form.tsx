"use client";
import { useWatch } from "react-hook-form";
import {
  Field,
  FormDialog,
  NumberInput,
  RadioButtons,
  Select,
  sendCommand,
  Textarea,
  TextInput,
  useProblemForm,
} from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import { recordInstrumentCheckInput } from "../input";
import { CHECK_VERDICT_WORDS, CHECK_VERDICTS, type FacilityParameter, type InstrumentRow } from "../model";
import { capital, parameterOptions } from "./options";

export interface CheckFormProps {
  instrument: InstrumentRow;
  parameters: FacilityParameter[];
  onClose: () => void;
  onDone: (text: string) => void;
}

const VERDICTS = CHECK_VERDICTS.map((value) => ({ value, label: capital(CHECK_VERDICT_WORDS[value]) }));

/** A check of an instrument just made, against a standard. */
export function CheckForm({ instrument, parameters, onClose, onDone }: CheckFormProps) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: recordInstrumentCheckInput,
    defaultValues: {
      instrumentId: instrument.id,
      parameterId: String(instrument.lastCheck?.parameterId ?? ""),
      standard: instrument.lastCheck?.standard ?? "",
      standardValue: String(instrument.lastCheck?.standardValue ?? ""),
      asFound: "",
      asLeft: "",
      unit: instrument.lastCheck?.unit ?? "",
      note: "",
    },
    send: async ({ instrumentId, ...values }, idempotencyKey) => {
      await sendCommand(`/api/v1/instruments/${instrumentId}/checks`, values, { idempotencyKey });
      onDone(`The check of ${instrument.code} is recorded: ${CHECK_VERDICT_WORDS[values.verdict]}.`);
    },
  });
  const parameterId = useWatch({ control: form.control, name: "parameterId" });
  const measured = parameters.find((each) => String(each.id) === String(parameterId));
  return (
    <FormDialog
      title={`Check of ${instrument.code}`}
      act="Record the check"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field label="Checked for" name="parameterId" error={errorOf("parameterId")}>
        <Select
          placeholder="No parameter in particular"
          options={parameterOptions(parameters.filter((each) => each.unit !== null))}
          {...form.register("parameterId", {
            onChange: (event: { target: { value: string } }) => {
              const chosen = parameters.find((each) => String(each.id) === event.target.value);
              form.setValue("unit", chosen?.unit ?? "");
            },
          })}
        />
      </Field>
      <Field
        label="Standard"
        name="standard"
        required
        error={errorOf("standard")}
        hint="What it was checked against, with lot or certificate."
      >
        <TextInput {...form.register("standard")} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label="Value of the standard" name="standardValue" error={errorOf("standardValue")}>
          <NumberInput signed {...form.register("standardValue")} />
        </Field>
        <Field label="Unit" name="unit" error={errorOf("unit")}>
          {measured ? (
            <Select
              options={measured.acceptedUnits.map((code) => ({
                value: code,
                label: unitLabel(code) || code,
              }))}
              {...form.register("unit")}
            />
          ) : (
            <TextInput {...form.register("unit")} />
          )}
        </Field>
        <Field
          label="As found"
          name="asFound"
          error={errorOf("asFound")}
          hint="Before anything was adjusted."
        >
          <NumberInput signed {...form.register("asFound")} />
        </Field>
        <Field label="As left" name="asLeft" error={errorOf("asLeft")} hint="After an adjustment.">
          <NumberInput signed {...form.register("asLeft")} />
        </Field>
      </div>
      <Field label="Verdict" name="verdict" group required error={errorOf("verdict")}>
        <RadioButtons options={VERDICTS} {...form.register("verdict")} />
      </Field>
      <Field label="Note" name="note" error={errorOf("note")}>
        <Textarea rows={2} {...form.register("note")} />
      </Field>
    </FormDialog>
  );
}
