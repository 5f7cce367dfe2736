"use client";
import {
  Checkbox,
  Field,
  FormDialog,
  Notice,
  NumberInput,
  Select,
  sendCommand,
  Textarea,
  useProblemForm,
} from "@/lib/ui";
import { levelFormInput } from "../input";
import { LENGTH_UNITS, type SystemRow, type VolumeSheet } from "../model";

type LevelFormProps = {
  sheet: VolumeSheet;
  /** Systems that may be joined with this one. */
  partners: readonly SystemRow[];
  onClose: () => void;
  onDone: (text: string) => void;
};

const UNITS = LENGTH_UNITS.map((unit) => ({ value: unit, label: unit }));

/** Says how a system stands today: its level, drained or not, joined with which others. */
export function LevelForm({ sheet, partners, onClose, onDone }: LevelFormProps) {
  const { system, level, joinedWith } = sheet;
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: levelFormInput,
    defaultValues: {
      levelOffset: { text: level ? centimetres(level.levelOffsetM) : "0", uncertainty: "" },
      lengthUnit: "cm",
      isDrained: level?.isDrained ?? false,
      joinedWith: joinedWith.map((each) => String(each.id)),
      reason: "",
    },
    send: async (values, idempotencyKey) => {
      await sendCommand("/api/v1/operating-levels", { ...values, systemId: system.id }, { idempotencyKey });
      onDone(`The level of ${system.code} is set.`);
    },
  });
  return (
    <FormDialog
      title={`How ${system.code} stands today`}
      act="Set the level"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <div className="grid grid-cols-[1fr_7rem] gap-3">
        <Field
          label="Level against the volume of record"
          name="levelOffset.text"
          required
          hint="Above is +, below is −."
          error={errorOf("levelOffset.text")}
        >
          <NumberInput signed {...form.register("levelOffset.text")} />
        </Field>
        <Field label="Unit" name="lengthUnit" required>
          <Select options={UNITS} {...form.register("lengthUnit")} />
        </Field>
      </div>
      <Field
        label="Standard uncertainty of the level"
        name="levelOffset.uncertainty"
        error={errorOf("levelOffset.uncertainty")}
      >
        <NumberInput {...form.register("levelOffset.uncertainty")} />
      </Field>
      <Checkbox label="Drained" {...form.register("isDrained")} />
      <Notice kind="caution" title="A drained tank is a confined space">
        Nobody enters but by your facility's own procedure and the local rules: isolation of pumps, power,
        ozone and water, air tested, somebody outside.
      </Notice>
      {partners.length > 0 && (
        <Field label="Shares its water with" name="joinedWith" group error={errorOf("joinedWith")}>
          <div className="max-h-56 overflow-y-auto border border-rule px-3">
            {partners.map((each) => (
              <Checkbox
                key={each.id}
                label={`${each.code} · ${each.name}`}
                value={String(each.id)}
                {...form.register("joinedWith")}
              />
            ))}
          </div>
        </Field>
      )}
      <Field label="Reason" name="reason" required error={errorOf("reason")}>
        <Textarea {...form.register("reason")} />
      </Field>
    </FormDialog>
  );
}

/** Metres as typed in centimetres, without the tail that binary numbers leave. */
const centimetres = (metres: number): string => String(Number((metres * 100).toPrecision(12)));
