"use client";
import { useRouter } from "next/navigation";
import {
  Button,
  Field,
  FormError,
  Notice,
  sendCommand,
  Textarea,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { closureForm } from "../input";

export interface CloseFormProps {
  incidentId: number;
  code: string;
  isStillOff: boolean;
  onlyYouActed: boolean;
}

/** A lead's last word; says what stands in its way. */
export function CloseForm({ incidentId, code, isStillOff, onlyYouActed }: CloseFormProps) {
  const router = useRouter();
  const say = useLiveMessage();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: closureForm,
    defaultValues: { closureText: "", stillOffReason: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand(`/api/v1/incidents/${incidentId}/closure`, values, { idempotencyKey });
      say({ text: `Incident ${code} is closed.` });
      router.refresh();
    },
  });
  if (onlyYouActed) {
    return (
      <p>
        Only you have acted on it. Another person must recheck it or write what they saw, or another lead must
        close it.
      </p>
    );
  }
  return (
    <form onSubmit={submit} noValidate className="grid gap-4">
      <FormError problem={problem} />
      {isStillOff && (
        <Notice kind="caution" title="The newest reading is still off">
          Measure again first. If it is to be closed all the same, say why.
        </Notice>
      )}
      <Field label="What was found and done" name="closureText" required error={errorOf("closureText")}>
        <Textarea rows={3} {...form.register("closureText")} />
      </Field>
      {isStillOff && (
        <Field
          label="Why it is closed while off"
          name="stillOffReason"
          required
          error={errorOf("stillOffReason")}
        >
          <Textarea rows={2} {...form.register("stillOffReason")} />
        </Field>
      )}
      <div>
        <Button type="submit" variant={isStillOff ? "plain" : "next"} busy={sending} busyText="Closing …">
          Close the incident
        </Button>
      </div>
    </form>
  );
}
