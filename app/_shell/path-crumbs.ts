import type { Crumb } from "@/lib/ui";
import { timeText } from "@/lib/ui/time-words";

/** Words for parts of addresses that are no menu entry; a code stands for itself, a number is left out. */
const PATH_WORDS: Readonly<Record<string, string>> = {
  account: "Your account",
  people: "People",
  change: "Change",
  watch: "What is read where",
  workbooks: "Changes",
  deputies: "Deputies",
  outbox: "Mail",
  roles: "Roles",
};

function decoded(part: string): string {
  try {
    return decodeURIComponent(part);
  } catch {
    return part;
  }
}

/** "30 Nov 2026" for "2026-11-30"; null for what is no day. */
function dayOf(part: string): string | null {
  const noon = /^\d{4}-\d{2}-\d{2}$/.test(part) ? Date.parse(`${part}T12:00:00Z`) : Number.NaN;
  const isDay = Number.isFinite(noon) && new Date(noon).toISOString().startsWith(part);
  return isDay ? timeText(noon, "UTC", "day") : null;
}

const isNumber = (part: string): boolean => /^\d+$/.test(part);

/** Parts of an address that are no page of their own: numbers, and the table within the history of a record. */
const hasNoPage = (parts: readonly string[], index: number): boolean =>
  isNumber(parts[index] ?? "") || (parts[0] === "history" && parts[1] === "record" && index > 0);

/** Addresses that only lead on to others: a step in words, with no page to open. */
const ONLY_ON_THE_WAY = [/^\/readings$/, /^\/rounds\/[^/]+$/, /^\/help\/formulas$/];

function wordsOf(part: string, href: string, entries: readonly { href: string; label: string }[]): string {
  const entry = entries.find((one) => one.href === href);
  if (entry) return entry.label;
  const plain = decoded(part);
  const known = PATH_WORDS[plain];
  if (known) return known;
  const day = dayOf(plain);
  if (day !== null) return day;
  // Codes such as KELP-01 stay as they are; words of an address begin with a capital.
  return /[A-Z]/.test(plain) ? plain : plain.charAt(0).toUpperCase() + plain.slice(1).replaceAll("-", " ");
}

/**
 * Where is a path, in words? One step a part of the path; the last one that has words is where you are.
 * A step links only to a page that exists.
 * @example pathCrumbs("/setup/people/3", [{ href: "/setup", label: "Setup" }])
 *   // [{ label: "Setup", href: "/setup" }, { label: "People", href: "/setup/people" }]
 */
export function pathCrumbs(path: string, entries: readonly { href: string; label: string }[]): Crumb[] {
  const parts = path.split("/").filter(Boolean);
  return parts.flatMap((part, index): Crumb[] => {
    if (hasNoPage(parts, index)) return [];
    const href = `/${parts.slice(0, index + 1).join("/")}`;
    const isHere = index === parts.length - 1;
    const label = wordsOf(part, href, entries);
    return [isHere || ONLY_ON_THE_WAY.some((form) => form.test(href)) ? { label } : { label, href }];
  });
}
