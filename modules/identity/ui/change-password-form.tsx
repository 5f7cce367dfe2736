"use client";
import { z } from "zod";
import { Button, Field, FormError, sendCommand, TextInput, useLiveMessage, useProblemForm } from "@/lib/ui";
import { changePasswordInput } from "../input";
import { NOT_THE_SAME, PASSWORD_HINT, PASSWORD_LABELS } from "./password-words";

const schema = changePasswordInput
  .extend({ again: z.string() })
  .refine((input) => input.password === input.again, { message: NOT_THE_SAME, path: ["again"] });

/** Changes one's own password; sessions on other devices end. */
export function ChangePasswordForm() {
  const say = useLiveMessage();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema,
    defaultValues: { current: "", password: "", again: "" },
    send: async ({ current, password }, idempotencyKey) => {
      await sendCommand("/api/v1/account/password", { current, password }, { idempotencyKey });
      form.reset();
      say({ text: "Your password has changed. Other devices must sign in again." });
    },
  });
  return (
    <form onSubmit={submit} noValidate className="grid gap-5">
      <FormError problem={problem} labels={PASSWORD_LABELS} />
      <Field label={PASSWORD_LABELS.current} name="current" error={errorOf("current")} required>
        <TextInput type="password" autoComplete="current-password" {...form.register("current")} />
      </Field>
      <Field
        label={PASSWORD_LABELS.password}
        name="password"
        hint={PASSWORD_HINT}
        error={errorOf("password")}
        required
      >
        <TextInput type="password" autoComplete="new-password" {...form.register("password")} />
      </Field>
      <Field label={PASSWORD_LABELS.again} name="again" error={errorOf("again")} required>
        <TextInput type="password" autoComplete="new-password" {...form.register("again")} />
      </Field>
      <div>
        <Button type="submit" busy={sending} busyText="Storing …">
          Change the password
        </Button>
      </div>
    </form>
  );
}
