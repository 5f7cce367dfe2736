"use client";
import { useRouter } from "next/navigation";
import { type ReactNode, useId } from "react";
import {
  Button,
  Dialog,
  Field,
  FormError,
  sendCommand,
  Textarea,
  TextInput,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { reviewFormInput } from "../input";
import type { ReviewOutcome } from "../model";

export interface SignDialogProps {
  outcome: ReviewOutcome;
  /** What is signed, each with the hash of what the person has before them. */
  sheets: readonly { areaId: number; onDay: string; contentHash: string }[];
  /** What the signature says, in sentences. */
  children: ReactNode;
  onClose: () => void;
  onDone?: () => void;
}

const WORDS = {
  reviewed: { title: "Sign as reviewed", act: "Sign", done: "Signed as reviewed." },
  returned: { title: "Return for more work", act: "Sign and return", done: "Returned." },
} as const;

/** Asks for the password, which is the signature, and for a comment; nothing is signed half. */
export function SignDialog({ outcome, sheets, children, onClose, onDone }: SignDialogProps) {
  const formId = useId();
  const router = useRouter();
  const say = useLiveMessage();
  const words = WORDS[outcome];
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: reviewFormInput,
    defaultValues: { comment: "", password: "" },
    send: async ({ comment, password }, idempotencyKey) => {
      await sendCommand("/api/v1/reviews", { outcome, comment, sheets, password }, { idempotencyKey });
      say({ text: words.done });
      onDone?.();
      onClose();
      router.refresh();
    },
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title={words.title}
      dismissable={false}
      actions={
        <>
          <Button variant="next" type="submit" form={formId} busy={sending} busyText="Signing …">
            {words.act}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </>
      }
    >
      <form id={formId} onSubmit={submit} noValidate className="grid gap-4">
        <FormError problem={problem} labels={{ password: "Password", comment: "Comment" }} />
        <div className="prose">{children}</div>
        <Field
          label={outcome === "returned" ? "What is to be done" : "Comment"}
          name="comment"
          required={outcome === "returned"}
          error={errorOf("comment")}
        >
          <Textarea rows={3} {...form.register("comment")} />
        </Field>
        <Field
          label="Your password"
          name="password"
          required
          error={errorOf("password")}
          hint="It stands for your signature: your name, this moment and the meaning are bound to the content."
        >
          <TextInput type="password" autoComplete="current-password" {...form.register("password")} />
        </Field>
      </form>
    </Dialog>
  );
}
