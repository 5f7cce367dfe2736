import type { Metadata } from "next";
import { cookies } from "next/headers";
import { askPage, pageActor } from "@/app/_server/session";
import { PageHead, Panel, readTheme, THEME_COOKIE, ThemeChoice } from "@/lib/ui";
import { getOwnAccount } from "@/modules/identity";
import { ChangePasswordForm } from "@/modules/identity/ui/change-password-form";
import { roleText } from "@/modules/identity/ui/role-words";
import { UnitsForm } from "@/modules/identity/ui/units-form";

export const metadata: Metadata = { title: "Your account" };

export default async function AccountPage() {
  const [actor, account] = [await pageActor(), await askPage(getOwnAccount, {})];
  const theme = readTheme((await cookies()).get(THEME_COOKIE)?.value);
  const roles = actor.roles.map(roleText).join(", ");
  return (
    <>
      <PageHead title={actor.name} facts={`${account?.email ?? ""} · ${roles === "" ? "no role" : roles}`} />
      <div className="grid items-start gap-5 lg:grid-cols-2">
        <Panel title="Password">
          <ChangePasswordForm />
        </Panel>
        <Panel title="Theme">
          <ThemeChoice current={theme} />
          <p className="mt-3 text-sm text-ink-3">
            For this device alone: stone indoors, dim for night rounds and dark galleries, bright in the sun.
          </p>
        </Panel>
        <Panel
          title="Units"
          aside="what you read and type; stored values stay as they are"
          className="lg:col-span-2"
        >
          <UnitsForm preferred={account?.preferredUnits ?? {}} />
        </Panel>
      </div>
      <p className="mt-5 text-sm text-ink-3">
        Your name and address are corrected by an administrator; the history keeps what they were.
      </p>
    </>
  );
}
