import type { Metadata } from "next";
import { AskResetForm } from "@/modules/identity/ui/ask-reset-form";

export const metadata: Metadata = { title: "New password" };

export default function AskResetPage() {
  return (
    <div className="grid gap-6">
      <h1>Ask for a new password</h1>
      <AskResetForm />
    </div>
  );
}
