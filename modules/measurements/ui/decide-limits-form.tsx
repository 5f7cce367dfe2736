"use client";
import { Field, FormDialog, sendCommand, Textarea, TextInput, useProblemForm } from "@/lib/ui";
import { decideLimitsFormInput } from "../input";
import type { LimitWorkbookDetail } from "../model";

export interface DecideLimitsFormProps {
  workbook: LimitWorkbookDetail["workbook"];
  rowCount: number;
  decision: "approve" | "decline";
  onClose: () => void;
  onDone: (text: string) => void;
}

/** A signature under a whole workbook: what it means, a comment, the password. */
export function DecideLimitsForm({ workbook, rowCount, decision, onClose, onDone }: DecideLimitsFormProps) {
  const isApproval = decision === "approve";
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: decideLimitsFormInput,
    defaultValues: { comment: "", password: "" },
    send: async (values, idempotencyKey) => {
      const path = `/api/v1/limits/workbooks/${workbook.id}/decision`;
      await sendCommand(path, { ...values, decision }, { idempotencyKey });
      onDone(isApproval ? "The limits are approved. Readings are judged again." : "The limits are declined.");
    },
  });
  const rows = rowCount === 1 ? "this row" : `all ${rowCount} rows`;
  return (
    <FormDialog
      title={`${isApproval ? "Approve" : "Decline"} “${workbook.title}”`}
      act={isApproval ? "Sign: approved" : "Sign: declined"}
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <p>
        {isApproval
          ? `With your signature ${rows} hold as proposed. Readings taken since are judged again by them.`
          : `With your signature ${rows} are set aside. What is in force now stays.`}
      </p>
      <Field
        label={isApproval ? "Comment" : "Why"}
        name="comment"
        required={!isApproval}
        error={errorOf("comment")}
      >
        <Textarea rows={2} {...form.register("comment")} />
      </Field>
      <Field
        label="Your password"
        name="password"
        required
        error={errorOf("password")}
        hint="It signs with your name and the time."
      >
        <TextInput type="password" autoComplete="current-password" {...form.register("password")} />
      </Field>
    </FormDialog>
  );
}
