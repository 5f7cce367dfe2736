import type { ReactNode } from "react";

/** A key to press, as printed on it. */
export function KeyHint({ children }: { children: ReactNode }) {
  return (
    <kbd className="inline-flex min-w-6 items-center justify-center rounded-sm border border-edge bg-field px-1.5 font-mono text-[0.8125rem] text-ink-2">
      {children}
    </kbd>
  );
}

/** A place that will soon be filled; says so to those who do not see it. */
export function Skeleton({ lines = 3, label = "Loading" }: { lines?: number; label?: string }) {
  return (
    <div role="status" className="grid gap-2.5">
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, index) => (
        <span
          key={index}
          className="skeleton-line block h-4 rounded-sm bg-band"
          style={{ width: `${100 - ((index * 17) % 40)}%` }}
        />
      ))}
    </div>
  );
}

/** What is read out by a screen reader only. */
export function Hidden({ children }: { children: ReactNode }) {
  return <span className="sr-only">{children}</span>;
}
