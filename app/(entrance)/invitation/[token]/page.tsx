import type { Metadata } from "next";
import { ChoosePassword } from "@/app/_shell/choose-password";

export const metadata: Metadata = { title: "Choose a password", referrer: "no-referrer" };

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <ChoosePassword
      title="Welcome: choose your password"
      token={token}
      stale="If you have chosen a password already, sign in. Otherwise ask your administrator to invite you again."
    />
  );
}
