"use client";
import { useState } from "react";
import {
  Button,
  Field,
  FormError,
  LinkButton,
  Notice,
  sendCommand,
  TextInput,
  useProblemForm,
} from "@/lib/ui";
import { requestResetInput } from "../input";

/** Asks for a link by mail; says the same whether or not there is such an account. */
export function AskResetForm() {
  const [asked, setAsked] = useState(false);
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: requestResetInput,
    defaultValues: { email: "" },
    send: async (values, idempotencyKey) => {
      await sendCommand("/api/v1/password/reset", values, { idempotencyKey });
      setAsked(true);
    },
  });
  if (asked) {
    return (
      <Notice
        title="Look into your mail"
        actions={<LinkButton href="/sign-in">Back to signing in</LinkButton>}
      >
        If that address belongs to an open account here, a letter with a link is on its way. The link works
        once, for an hour. Without a letter after some minutes, look among the unwanted mail, or ask your
        administrator.
      </Notice>
    );
  }
  return (
    <form onSubmit={submit} noValidate className="grid gap-5">
      <FormError problem={problem} labels={{ email: "E-mail address" }} />
      <Field label="E-mail address" name="email" error={errorOf("email")} required>
        <TextInput type="email" autoComplete="username" {...form.register("email")} />
      </Field>
      <div className="flex flex-wrap gap-2.5">
        <Button type="submit" variant="next" busy={sending} busyText="Asking …">
          Send me a link
        </Button>
        <LinkButton href="/sign-in">Back to signing in</LinkButton>
      </div>
    </form>
  );
}
