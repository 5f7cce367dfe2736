import type { ReactNode } from "react";

/** The staff at the side of a page outside the house: its water stands low, for nobody has come in yet. */
function QuietStaff() {
  return (
    <svg className="h-full w-full" aria-hidden="true">
      <defs>
        <pattern id="staff-marks" width="100%" height="60" patternUnits="userSpaceOnUse">
          <path d="M0 .5H34M0 12.5H12M0 24.5H12M0 36.5H12M0 48.5H12" className="stroke-edge" />
        </pattern>
      </defs>
      <rect y="62%" width="100%" height="38%" className="fill-wash" />
      <rect width="34" height="100%" fill="url(#staff-marks)" />
      <rect y="62%" width="100%" height="3" className="fill-water" />
    </svg>
  );
}

/** A page for people who are not (yet) inside: one narrow column under the name, beside a graduated staff. */
export function PlainFrame({ facility, children }: { facility?: string; children: ReactNode }) {
  return (
    <div className="grid min-h-dvh grid-cols-[20px_minmax(0,1fr)] sm:grid-cols-[84px_minmax(0,1fr)] lg:grid-cols-[22vw_minmax(0,1fr)]">
      <div className="border-r border-edge">
        <QuietStaff />
      </div>
      <main id="page" tabIndex={-1} className="w-full max-w-xl px-5 py-10 outline-none sm:px-12 sm:py-16">
        <p className="font-head text-2xl font-extrabold tracking-tight">Stillwell</p>
        <p className="mb-10 text-ink-2">{facility ?? "Where a facility's water is read truly"}</p>
        {children}
      </main>
    </div>
  );
}
