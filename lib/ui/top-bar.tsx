import Link from "next/link";
import type { ReactNode } from "react";

export interface Crumb {
  label: string;
  /** Without it, the crumb is words alone; the last one is where you are. */
  href?: string;
}

export interface TopBarProps {
  crumbs?: readonly Crumb[];
  /** The day being worked on, as written ("Tue 14 Jul"). */
  day?: string;
  /** Words before the day. */
  dayLabel?: string;
  /** The clock and the place ("09:42 Corran Sound"), or a live component. */
  clock?: ReactNode;
  person?: ReactNode;
  /** Controls at the far right: theme choice, sign out, messages. */
  children?: ReactNode;
}

/** The line above every page: where you are, which day counts, what time it is there, and who you are. */
export function TopBar({
  crumbs = [],
  day,
  dayLabel = "Operational day",
  clock,
  person,
  children,
}: TopBarProps) {
  return (
    <header className="topbar flex min-h-[58px] flex-wrap items-center gap-x-6 gap-y-1 border-b border-rule py-2 text-[0.9375rem] text-ink-2">
      {crumbs.length > 0 && <Crumbs crumbs={crumbs} />}
      <div className="flex flex-wrap items-center gap-x-6 gap-y-1 sm:ml-auto">
        {(day !== undefined || clock !== undefined) && (
          <span>
            {day !== undefined && (
              <>
                <span className="max-sm:sr-only">{dayLabel} </span>
                <b className="font-semibold text-ink">{day}</b>
              </>
            )}
            {day !== undefined && clock !== undefined && <span aria-hidden="true"> · </span>}
            {clock}
          </span>
        )}
        {person !== undefined && <span>{person}</span>}
        {children}
      </div>
    </header>
  );
}

function Crumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Breadcrumb" className="min-w-0">
      <ol className="flex flex-wrap items-center">
        {crumbs.map((crumb, index) => (
          <li key={`${index}-${crumb.label}`} className="flex items-center">
            {index > 0 && (
              <span aria-hidden="true" className="px-1.5 text-ink-3">
                /
              </span>
            )}
            {crumb.href === undefined ? (
              <CrumbWords label={crumb.label} isHere={index === crumbs.length - 1} />
            ) : (
              <Link
                href={crumb.href}
                className="inline-flex min-h-6 items-center hover:underline underline-offset-4"
              >
                {crumb.label}
              </Link>
            )}
          </li>
        ))}
      </ol>
    </nav>
  );
}

function CrumbWords({ label, isHere }: { label: string; isHere: boolean }) {
  if (!isHere) return <span>{label}</span>;
  return (
    <span aria-current="page" className="font-semibold text-ink">
      {label}
    </span>
  );
}
