"use client";
import { useRouter } from "next/navigation";
import { useId } from "react";
import { systemClock } from "@/lib/clock";
import {
  Button,
  Dialog,
  Field,
  FormError,
  Select,
  sendCommand,
  Textarea,
  TextInput,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { newIncidentForm } from "../input";
import { dueIn, RECHECK_OPTIONS } from "./incident-words";

export interface NewIncidentDialogProps {
  readingId: number;
  proposedTitle: string;
  onClose: () => void;
  onDone: () => void;
}

/** Takes a reading that is off up as an incident. */
export function NewIncidentDialog({ readingId, proposedTitle, onClose, onDone }: NewIncidentDialogProps) {
  const formId = useId();
  const router = useRouter();
  const say = useLiveMessage();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: newIncidentForm,
    defaultValues: { title: proposedTitle, note: "", recheckHours: "" },
    send: async ({ title, note, recheckHours }, idempotencyKey) => {
      const body = { readingId, title, note, recheckDueAt: dueIn(recheckHours, systemClock.now()) };
      const { data } = await sendCommand<{ data: { code: string } }>("/api/v1/incidents", body, {
        idempotencyKey,
      });
      say({ text: `Incident ${data.code} is open.` });
      onDone();
      onClose();
      router.refresh();
    },
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title="Take up as an incident"
      dismissable={false}
      actions={
        <>
          <Button variant="next" type="submit" form={formId} busy={sending} busyText="Opening …">
            Open the incident
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </>
      }
    >
      <form
        id={formId}
        onSubmit={(event) => {
          event.stopPropagation();
          void submit(event);
        }}
        noValidate
        className="grid gap-4"
      >
        <FormError problem={problem} />
        <p className="text-ink-2">
          The reading is explained by it. Later readings of the same trouble join it, so nobody explains it
          twice.
        </p>
        <Field label="What is wrong" name="title" required error={errorOf("title")}>
          <TextInput {...form.register("title")} />
        </Field>
        <Field label="What you saw or did" name="note" error={errorOf("note")}>
          <Textarea rows={3} {...form.register("note")} />
        </Field>
        <Field label="Measure again" name="recheckHours" error={errorOf("recheckHours")}>
          <Select options={RECHECK_OPTIONS} {...form.register("recheckHours")} />
        </Field>
      </form>
    </Dialog>
  );
}
