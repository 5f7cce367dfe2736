"use client";
import { usePathname } from "next/navigation";
import { type Theme, TopBar } from "@/lib/ui";
import { FacilityClock } from "./facility-clock";
import { pathCrumbs } from "./path-crumbs";
import { PersonMenu } from "./person-menu";

export interface ShellBarProps {
  entries: readonly { href: string; label: string }[];
  /** The operational day, as written. */
  day: string;
  /** The server's moment, UTC epoch ms. */
  now: number;
  zone: string;
  facility: string;
  person: string;
  theme: Theme;
}

/** The line above every page: where you are, the operational day, the time here, and you. */
export function ShellBar({ entries, day, now, zone, facility, person, theme }: ShellBarProps) {
  const path = usePathname();
  return (
    <TopBar
      crumbs={pathCrumbs(path, entries)}
      day={day}
      clock={<FacilityClock now={now} zone={zone} facility={facility} />}
    >
      <PersonMenu name={person} theme={theme} />
    </TopBar>
  );
}
