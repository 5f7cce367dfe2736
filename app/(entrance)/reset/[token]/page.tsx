import type { Metadata } from "next";
import { ChoosePassword } from "@/app/_shell/choose-password";

export const metadata: Metadata = { title: "Choose a password", referrer: "no-referrer" };

export default async function ResetPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <ChoosePassword
      title="Choose a new password"
      token={token}
      stale="Ask for another one; it lasts for an hour."
    />
  );
}
