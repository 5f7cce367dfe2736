"use client";
import { Field, FormDialog, sendCommand, Textarea, useProblemForm } from "@/lib/ui";
import { reasonFormInput } from "../input";
import type { FacilityParameter } from "../model";

export interface RetireParameterFormProps {
  parameter: FacilityParameter;
  onClose: () => void;
  onDone: (text: string) => void;
}

/** Takes a parameter out of use for good, with a reason. */
export function RetireParameterForm({ parameter, onClose, onDone }: RetireParameterFormProps) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: reasonFormInput,
    defaultValues: { reason: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand(`/api/v1/parameters/${parameter.id}/retirement`, values, { idempotencyKey });
      onDone(`${parameter.name} is retired.`);
    },
  });
  return (
    <FormDialog
      title={`Retire ${parameter.name}`}
      act="Retire the parameter"
      actVariant="danger"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <p>Its readings stay and are shown; new ones are not taken. It does not come back.</p>
      <Field label="Reason" name="reason" required error={errorOf("reason")}>
        <Textarea {...form.register("reason")} />
      </Field>
    </FormDialog>
  );
}
