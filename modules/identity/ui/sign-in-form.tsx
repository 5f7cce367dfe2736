"use client";
import { signIn } from "next-auth/react";
import { useState } from "react";
import { Button, Field, Notice, TextInput } from "@/lib/ui";

const WORDS = {
  refused:
    "That e-mail address and password do not belong together here, or the account is not open. Check both, or ask for a new password.",
  throttled: "There have been too many tries. Wait a quarter of an hour, then try again.",
  unreachable: "The server cannot be reached. Check the network, then try again.",
} as const;

type Trouble = keyof typeof WORDS;

async function tryToEnter(email: string, password: string): Promise<Trouble | null> {
  try {
    const answer = await signIn("credentials", { email, password, redirect: false });
    if (answer?.ok && !answer.error) return null;
    return answer?.error === "throttled" ? "throttled" : "refused";
  } catch {
    return "unreachable";
  }
}

export interface SignInFormProps {
  /** Path to go to afterwards. */
  goTo: string;
}

/** E-mail and password. Says the same whatever was wrong with them. */
export function SignInForm({ goTo }: SignInFormProps) {
  const [trouble, setTrouble] = useState<Trouble | null>(null);
  const [busy, setBusy] = useState(false);

  async function submit(form: FormData) {
    setBusy(true);
    const found = await tryToEnter(String(form.get("email") ?? ""), String(form.get("password") ?? ""));
    if (found === null) {
      // A whole load: the page that comes belongs to another person than the one before it.
      window.location.assign(goTo);
      return;
    }
    setTrouble(found);
    setBusy(false);
  }

  return (
    <form
      method="post"
      onSubmit={(event) => {
        event.preventDefault();
        void submit(new FormData(event.currentTarget));
      }}
      className="grid gap-5"
    >
      <div role="alert">
        {trouble !== null && (
          <Notice kind="stop" title="Not signed in">
            {WORDS[trouble]}
          </Notice>
        )}
      </div>
      <Field label="E-mail address" name="email" required>
        <TextInput name="email" type="email" autoComplete="username" required maxLength={200} />
      </Field>
      <Field label="Password" name="password" required>
        <TextInput name="password" type="password" autoComplete="current-password" required maxLength={200} />
      </Field>
      <div>
        <Button type="submit" variant="next" size="large" busy={busy} busyText="Signing in …">
          Sign in
        </Button>
      </div>
    </form>
  );
}
