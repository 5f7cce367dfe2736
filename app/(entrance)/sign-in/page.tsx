import type { Metadata } from "next";
import Link from "next/link";
import { Notice } from "@/lib/ui";
import { SignInForm } from "@/modules/identity/ui/sign-in-form";

export const metadata: Metadata = { title: "Sign in" };

type Search = { ended?: string; set?: string; to?: string };

/** Only a path of this site: never another site's address. */
function pathOf(to: string | undefined): string {
  return to !== undefined && /^\/(?![/\\])[\w\-./?=&%]*$/.test(to) ? to : "/";
}

export default async function SignInPage({ searchParams }: { searchParams: Promise<Search> }) {
  const { ended, set, to } = await searchParams;
  return (
    <div className="grid gap-6">
      <h1>Sign in</h1>
      {ended !== undefined && (
        <Notice title="Your session has ended">Sign in again to go on. What was stored is stored.</Notice>
      )}
      {set !== undefined && (
        <Notice title="Your password is set">Sign in with your e-mail address and the new password.</Notice>
      )}
      <SignInForm goTo={pathOf(to)} />
      <p>
        <Link href="/reset" className="link">
          I have forgotten my password
        </Link>
      </p>
      <p className="text-sm text-ink-3">
        Places are given by your administrator, by an invitation in your mail. Stillwell keeps records; it is
        not a life-safety alarm.
      </p>
    </div>
  );
}
