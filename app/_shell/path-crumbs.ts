import type { Crumb } from "@/lib/ui";

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

const isNumber = (part: string): boolean => /^\d+$/.test(part);

/** Parts of an address that are no page of their own: numbers, and the table within the history of a record. */
const hasNoPage = (parts: readonly string[], index: number): boolean =>
  isNumber(parts[index] ?? "") || (parts[0] === "history" && parts[1] === "record" && index > 0);

function wordsOf(part: string, href: string, entries: readonly { href: string; label: string }[]): string {
  const entry = entries.find((one) => one.href === href);
  if (entry) return entry.label;
  const plain = decoded(part);
  const known = PATH_WORDS[plain];
  if (known) return known;
  if (/^\d{4}-\d{2}-\d{2}$/.test(plain)) return plain;
  // Codes such as KELP-01 stay as they are; words of an address begin with a capital.
  return /[A-Z]/.test(plain) ? plain : plain.charAt(0).toUpperCase() + plain.slice(1).replaceAll("-", " ");
}

/**
 * Where is a path, in words? One step a part of the path; the last one that has words is where you are.
 * @example pathCrumbs("/setup/people/3", [{ href: "/setup", label: "Setup" }])
 *   // [{ label: "Setup", href: "/setup" }, { label: "People", href: "/setup/people" }]
 */
export function pathCrumbs(path: string, entries: readonly { href: string; label: string }[]): Crumb[] {
  const parts = path.split("/").filter(Boolean);
  const crumbs = parts.flatMap((part, index) => {
    if (hasNoPage(parts, index)) return [];
    const href = `/${parts.slice(0, index + 1).join("/")}`;
    return [{ label: wordsOf(part, href, entries), href }];
  });
  const last = crumbs.at(-1);
  if (last?.href !== `/${parts.join("/")}`) return crumbs;
  return [...crumbs.slice(0, -1), { label: last.label }];
}
