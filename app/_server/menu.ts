import "server-only";
import { type Actor, may, type Permission } from "@/modules/access";
import { auditMay } from "@/modules/audit";
import { importsMay } from "@/modules/imports";
import { measurementsMay } from "@/modules/measurements";
import { qualityMay } from "@/modules/quality";
import { roundsMay } from "@/modules/rounds";
import { systemsMay } from "@/modules/systems";

export type MenuEntry = {
  href: string;
  label: string;
  /** One of these is needed; `everyone` who is signed in otherwise. */
  for: readonly Permission[] | "everyone";
  /** At the foot of the staff: not part of the day's work. */
  foot?: boolean;
};

/**
 * The menu, in the order on screen: Today, Rounds, Systems, Imports, Incidents, Review, History; at the foot Setup, Help.
 * An entry stands here once its page works (tests/architecture/menu.test.ts sees to it).
 */
export const MENU: readonly MenuEntry[] = [
  {
    href: "/today",
    label: "Today",
    for: [measurementsMay.read],
  },
  {
    href: "/rounds",
    label: "Rounds",
    for: [roundsMay.read],
  },
  { href: "/systems", label: "Systems", for: [systemsMay.read] },
  { href: "/charts", label: "Charts", for: [measurementsMay.read] },
  { href: "/imports", label: "Imports", for: [importsMay.read] },
  {
    href: "/incidents",
    label: "Incidents",
    for: [qualityMay.read],
  },
  {
    href: "/review",
    label: "Review",
    for: [roundsMay.read],
  },
  { href: "/history", label: "History", for: [auditMay.readHistory] },
  {
    href: "/setup",
    label: "Setup",
    for: "everyone",
    foot: true,
  },
  { href: "/help", label: "Help", for: "everyone", foot: true },
];

/** The entries that an actor sees. */
export function menuFor(actor: Actor): { items: MenuEntry[]; footItems: MenuEntry[] } {
  const seen = MENU.filter((entry) => entry.for === "everyone" || entry.for.some((one) => may(actor, one)));
  return { items: seen.filter((entry) => !entry.foot), footItems: seen.filter((entry) => entry.foot) };
}

/** Where somebody lands after signing in: the first entry of their menu, or their account. */
export function homeOf(actor: Actor): string {
  const { items, footItems } = menuFor(actor);
  return (items[0] ?? footItems[0])?.href ?? "/account";
}
