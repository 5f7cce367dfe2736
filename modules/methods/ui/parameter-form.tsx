"use client";
import { useWatch } from "react-hook-form";
import {
  Checkbox,
  Field,
  FormDialog,
  NumberInput,
  Select,
  sendCommand,
  Textarea,
  TextInput,
  useProblemForm,
} from "@/lib/ui";
import { createParameterInput } from "../input";
import {
  type FacilityParameter,
  PARAMETER_GROUP_WORDS,
  PARAMETER_GROUPS,
  PARAMETER_KIND_WORDS,
  PARAMETER_KINDS,
} from "../model";
import { AnswersField } from "./answers-field";
import { capital, storedUnitOptions } from "./options";
import { UnitsField } from "./units-field";

export interface ParameterFormProps {
  parameter: FacilityParameter | null;
  onClose: () => void;
  onDone: (text: string) => void;
}

const text = (value: number | null | undefined) =>
  value === null || value === undefined ? "" : String(value);

const valuesOf = (parameter: FacilityParameter | null) => ({
  code: parameter?.code ?? "",
  name: parameter?.name ?? "",
  kind: parameter?.kind ?? ("number" as const),
  unit: parameter?.unit ?? "",
  acceptedUnits: [...(parameter?.acceptedUnits ?? [])],
  decimals: text(parameter?.decimals ?? 1),
  plausible: { low: text(parameter?.plausible.low), high: text(parameter?.plausible.high) },
  choices: parameter?.choices.map((choice) => ({ ...choice })) ?? [],
  group: parameter?.group ?? ("physics" as const),
  mayBeNegative: parameter?.mayBeNegative ?? false,
  note: parameter?.note ?? "",
});

/** A new parameter, or changes to one; what readings rest on is shown and stays. */
export function ParameterForm({ parameter, onClose, onDone }: ParameterFormProps) {
  const problemForm = useProblemForm({
    schema: createParameterInput,
    defaultValues: valuesOf(parameter),
    send: async (values, idempotencyKey) => {
      if (parameter) {
        await sendCommand(`/api/v1/parameters/${parameter.id}`, values, { idempotencyKey, method: "PUT" });
      } else await sendCommand("/api/v1/parameters", values, { idempotencyKey });
      onDone(`${values.name} is ${parameter ? "changed" : "set up"}.`);
    },
  });
  const { form, problem, submit, errorOf, sending } = problemForm;
  const kind = useWatch({ control: form.control, name: "kind" });
  const isMeasured = kind === "number" || kind === "count";
  const isFixed = parameter !== null;
  return (
    <FormDialog
      title={parameter ? parameter.name : "New parameter"}
      act={parameter ? "Save the parameter" : "Set up the parameter"}
      wide
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      {isFixed && (
        <p className="text-ink-2">
          Code <b className="num">{parameter.code}</b>, {PARAMETER_KIND_WORDS[parameter.kind]}
          {parameter.unit !== null && `, stored in ${parameter.unit}`}. These never change: readings may be
          stored already.
        </p>
      )}
      <div className="grid gap-4 sm:grid-cols-2">
        {!isFixed && (
          <Field
            label="Code"
            name="code"
            required
            error={errorOf("code")}
            hint="As files carry it: nitrate_n."
          >
            <TextInput {...form.register("code")} />
          </Field>
        )}
        <Field label="Name" name="name" required error={errorOf("name")}>
          <TextInput {...form.register("name")} />
        </Field>
        {!isFixed && (
          <Field label="Its value is a" name="kind" required error={errorOf("kind")}>
            <Select
              options={PARAMETER_KINDS.map((value) => ({ value, label: PARAMETER_KIND_WORDS[value] }))}
              {...form.register("kind", {
                onChange: (event: { target: { value: string } }) => {
                  // what belongs to another kind of value would only be refused
                  const measured = ["number", "count"].includes(event.target.value);
                  if (!measured) {
                    form.setValue("unit", "");
                    form.setValue("acceptedUnits", []);
                    form.setValue("plausible", { low: "", high: "" });
                  }
                  form.setValue("decimals", event.target.value === "number" ? "1" : "0");
                  form.setValue("choices", event.target.value === "yes-no" ? YES_NO : []);
                },
              })}
            />
          </Field>
        )}
        <Field label="Group" name="group" required error={errorOf("group")}>
          <Select
            options={PARAMETER_GROUPS.map((value) => ({ value, label: PARAMETER_GROUP_WORDS[value] }))}
            {...form.register("group")}
          />
        </Field>
        {isMeasured && !isFixed && (
          <Field
            label="Unit"
            name="unit"
            error={errorOf("unit")}
            hint="Values are stored in it. It never changes afterwards."
          >
            <Select
              placeholder="None, a bare number"
              options={storedUnitOptions()}
              {...form.register("unit", {
                onChange: (event: { target: { value: string } }) => {
                  form.setValue("acceptedUnits", event.target.value === "" ? [] : [event.target.value]);
                },
              })}
            />
          </Field>
        )}
        {isMeasured && (
          <>
            <Field label="Decimals shown" name="decimals" required error={errorOf("decimals")}>
              <TextInput inputMode="numeric" {...form.register("decimals")} />
            </Field>
            <Field
              label="Lowest plausible value"
              name="plausible.low"
              error={errorOf("plausible.low")}
              hint="Below it a value cannot be. Not a limit."
            >
              <NumberInput signed {...form.register("plausible.low")} />
            </Field>
            <Field label="Highest plausible value" name="plausible.high" error={errorOf("plausible.high")}>
              <NumberInput signed {...form.register("plausible.high")} />
            </Field>
          </>
        )}
      </div>
      {isMeasured && <UnitsField form={form} error={errorOf("acceptedUnits")} />}
      {isMeasured && <Checkbox label="May be negative" {...form.register("mayBeNegative")} />}
      {(kind === "yes-no" || kind === "choice") && (
        <AnswersField
          problemForm={problemForm}
          isYesNo={kind === "yes-no"}
          fixed={parameter?.choices.length ?? 0}
        />
      )}
      <Field label="Note" name="note" error={errorOf("note")}>
        <Textarea rows={2} {...form.register("note")} />
      </Field>
    </FormDialog>
  );
}

const YES_NO = (["yes", "no"] as const).map((code) => ({
  code,
  label: capital(code),
  means: "within" as const,
}));
