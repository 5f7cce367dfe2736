"use client";
import { useRouter } from "next/navigation";
import { z } from "zod";
import { Button, Field, FormError, sendCommand, TextInput, useProblemForm } from "@/lib/ui";
import { setPasswordInput } from "../input";
import { NOT_THE_SAME, PASSWORD_HINT, PASSWORD_LABELS } from "./password-words";

const schema = setPasswordInput
  .extend({ again: z.string() })
  .refine((input) => input.password === input.again, { message: NOT_THE_SAME, path: ["again"] });

/** Chooses a password by a one-time link. */
export function SetPasswordForm({ token }: { token: string }) {
  const router = useRouter();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema,
    defaultValues: { token, password: "", again: "" },
    send: async ({ password }, idempotencyKey) => {
      await sendCommand("/api/v1/password/set", { token, password }, { idempotencyKey });
      router.push("/sign-in?set=1");
    },
  });
  return (
    <form onSubmit={submit} noValidate className="grid gap-5">
      <FormError problem={problem} labels={PASSWORD_LABELS} />
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
        <Button type="submit" variant="next" size="large" busy={sending} busyText="Storing …">
          Set the password
        </Button>
      </div>
    </form>
  );
}
