import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { LinkButton } from "@/lib/ui";
import { findOpenLink } from "@/modules/identity";
import { SetPasswordForm } from "@/modules/identity/ui/set-password-form";

/** Choosing a password by a one-time link; a link that is no good says how to get another. */
export function ChoosePassword({ title, token, stale }: { title: string; token: string; stale: string }) {
  if (!findOpenLink(database().reader.orm, token, systemClock.now())) {
    return (
      <div className="grid gap-6">
        <h1>This link does not work any more</h1>
        <p className="prose">It has been used, was replaced by a newer one, or is too old. {stale}</p>
        <div className="flex flex-wrap gap-2.5">
          <LinkButton href="/reset">Ask for a new password</LinkButton>
          <LinkButton href="/sign-in">Sign in</LinkButton>
        </div>
      </div>
    );
  }
  return (
    <div className="grid gap-6">
      <h1>{title}</h1>
      <SetPasswordForm token={token} />
    </div>
  );
}
