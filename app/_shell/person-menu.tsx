"use client";
import { useRouter } from "next/navigation";
import { signOut } from "next-auth/react";
import { useState } from "react";
import { Menu, THEME_WORDS, THEMES, type Theme, useLiveMessage } from "@/lib/ui";
import { chooseTheme } from "@/lib/ui/theme-choice";

/** Who is signed in; behind it the account, this device's theme and the way out. */
export function PersonMenu({ name, theme }: { name: string; theme: Theme }) {
  const router = useRouter();
  const say = useLiveMessage();
  const [current, setCurrent] = useState(theme);

  async function leave() {
    try {
      await signOut({ callbackUrl: "/sign-in" });
    } catch {
      say({ text: "You are still signed in: the server cannot be reached. Try again.", kind: "trouble" });
    }
  }

  const themes = THEMES.filter((one) => one !== current).map((one) => ({
    id: one,
    label: `Theme ${THEME_WORDS[one].name}: ${THEME_WORDS[one].use}`,
    onAction: () => {
      chooseTheme(one);
      setCurrent(one);
    },
  }));
  return (
    <Menu
      label={name}
      ariaLabel={`${name}: account, theme, sign out`}
      variant="quiet"
      entries={[
        { id: "account", label: "Your account", onAction: () => router.push("/account") },
        ...themes,
        { id: "leave", label: "Sign out", onAction: () => void leave() },
      ]}
    />
  );
}
