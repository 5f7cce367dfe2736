import Link from "next/link";
import { agoText } from "@/lib/ui";
import type { SheetGap } from "../model";

export interface GapListProps {
  gaps: readonly SheetGap[];
  now: number;
  /** Where a person may enter readings, the system's code leads there. */
  mayEnter: boolean;
}

/** What was due and has not been read, by system. */
export function GapList({ gaps, now, mayEnter }: GapListProps) {
  const bySystem = new Map<string, SheetGap[]>();
  for (const gap of gaps) bySystem.set(gap.systemCode, [...(bySystem.get(gap.systemCode) ?? []), gap]);
  return (
    <ul className="divide-y divide-rule border-t border-rule">
      {[...bySystem].map(([code, missing]) => (
        <li key={code} className="flex flex-wrap items-baseline gap-x-3 gap-y-0.5 py-2 break-inside-avoid">
          <Link
            href={mayEnter ? `/systems/${code}/entry` : `/systems/${code}`}
            className="link min-h-6 font-semibold"
          >
            {code}
          </Link>
          <span className="min-w-0 flex-1 basis-60 text-ink-2">
            {missing.map((gap) => gap.parameterName).join(", ")}
          </span>
          <span className="text-sm text-ink-3">{lastWords(missing, now)}</span>
        </li>
      ))}
    </ul>
  );
}

/** When the one that was read longest ago was last read. */
function lastWords(gaps: readonly SheetGap[], now: number): string {
  const moments = gaps.map((gap) => gap.lastAt);
  if (moments.includes(null)) return "never read";
  return `last read ${agoText(Math.min(...moments.map((at) => at ?? 0)), now)}`;
}
