"use client";
import { Checkbox, Field, FormDialog, Notice, sendCommand, Textarea, useProblemForm } from "@/lib/ui";
import { approvalFormInput, reasonFormInput } from "../input";
import type { DeterminationRow, VolumeUnit } from "../model";
import { VolumeQuantity } from "./volume-quantity";

type DecideProps = {
  proposed: DeterminationRow;
  unit: VolumeUnit;
  onClose: () => void;
  onDone: (text: string) => void;
};

const quantityOf = (row: DeterminationRow) => ({
  value: row.volumeL,
  standardUncertainty: row.standardUncertaintyL,
});

/** A lead approves a proposed volume; one that contradicts the volume of record is taken only knowingly. */
export function ApproveForm({ proposed, unit, onClose, onDone }: DecideProps) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: approvalFormInput,
    defaultValues: { reason: "", acceptsDisagreement: false },
    send: async (values, idempotencyKey) => {
      await sendCommand(`/api/v1/volumes/${proposed.id}/approve`, values, { idempotencyKey });
      onDone(`The volume of ${proposed.systemCode} is approved.`);
    },
  });
  return (
    <FormDialog
      title={`Approve the volume of ${proposed.systemCode}`}
      act="Approve"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <p>
        <b>{<VolumeQuantity volumeL={quantityOf(proposed)} unit={unit} />}</b>, proposed by{" "}
        {proposed.proposedBy}
      </p>
      {proposed.disagreement !== null && (
        <>
          <Notice kind="caution" title="It contradicts the volume of record">
            {proposed.disagreement}
          </Notice>
          <Checkbox label="Take it all the same" {...form.register("acceptsDisagreement")} />
        </>
      )}
      <Field label="Remark" name="reason" error={errorOf("reason")}>
        <Textarea {...form.register("reason")} />
      </Field>
    </FormDialog>
  );
}

/** A lead sets a proposed volume aside and says why. */
export function DeclineForm({ proposed, onClose, onDone }: DecideProps) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: reasonFormInput,
    defaultValues: { reason: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand(`/api/v1/volumes/${proposed.id}/decline`, values, { idempotencyKey });
      onDone(`The proposed volume of ${proposed.systemCode} is declined.`);
    },
  });
  return (
    <FormDialog
      title={`Decline the volume of ${proposed.systemCode}`}
      act="Decline"
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field
        label="Reason"
        name="reason"
        required
        error={errorOf("reason")}
        hint={`${proposed.proposedBy} reads it.`}
      >
        <Textarea {...form.register("reason")} />
      </Field>
    </FormDialog>
  );
}
