import "server-only";
import { settings } from "@/lib/env";

/** Settings that are secrets: shown as set or not set, never by value. */
const SECRETS = ["NEXTAUTH_SECRET", "SMTP_PASSWORD"] as const;
/** What is worked out from other settings, or is another name for one. */
const DERIVED = ["dataFolder", "databaseFile", "dayCutMinutes", "secureCookies"];

/** The settings that this process works with, in the order of the README's table. */
export function settingsInForce(): { name: string; value: string }[] {
  const secrets: readonly string[] = SECRETS;
  const shown = Object.entries(settings()).filter(
    ([name]) => !DERIVED.includes(name) && !secrets.includes(name),
  );
  const current = settings();
  return [
    ...shown.map(([name, value]) => ({ name, value: value === undefined ? "not set" : String(value) })),
    ...SECRETS.map((name) => ({ name, value: current[name] ? "set (not shown)" : "not set" })),
  ];
}
