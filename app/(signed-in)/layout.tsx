import { cookies } from "next/headers";
import type { ReactNode } from "react";
import { homeOf, menuFor } from "@/app/_server/menu";
import { pageActor } from "@/app/_server/session";
import { ShellBar } from "@/app/_shell/shell-bar";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { Frame, readTheme, StaffNav, THEME_COOKIE, timeText } from "@/lib/ui";
import { operationalDayOf } from "@/lib/zone";

/** The day being worked on, as it stands at the top of every page: "Mon 2 Mar". */
function operationalDayText(now: number): string {
  const { STILLWELL_ZONE, dayCutMinutes } = settings();
  const on = operationalDayOf(now, STILLWELL_ZONE, dayCutMinutes);
  return timeText(Date.parse(`${on}T12:00:00Z`), "UTC", "weekday");
}

const toItem = ({ href, label }: { href: string; label: string }) => ({ href, label });

export default async function SignedInLayout({ children }: { children: ReactNode }) {
  const actor = await pageActor();
  const menu = menuFor(actor);
  const items = menu.items.map(toItem);
  const footItems = menu.footItems.map(toItem);
  const { STILLWELL_ZONE, STILLWELL_FACILITY } = settings();
  const now = systemClock.now();
  const theme = readTheme((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <Frame
      nav={<StaffNav mark="Stillwell" items={items} footItems={footItems} homeHref={homeOf(actor)} />}
      top={
        <ShellBar
          entries={[...items, ...footItems]}
          day={operationalDayText(now)}
          now={now}
          zone={STILLWELL_ZONE}
          facility={STILLWELL_FACILITY}
          person={actor.name}
          theme={theme}
        />
      }
    >
      {children}
    </Frame>
  );
}
