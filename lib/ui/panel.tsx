import type { ReactNode } from "react";

export interface PanelProps {
  title?: ReactNode;
  /** A quiet addition after the title ("since 1 March"). */
  aside?: ReactNode;
  /** At the right of the title: a link or a small button. */
  actions?: ReactNode;
  id?: string;
  /** `open` has no sheet and no frame: a heading over a hairline, to stand inside another panel or on the page. */
  look?: "sheet" | "open";
  headingLevel?: 2 | 3;
  className?: string;
  children?: ReactNode;
}

/** A part of a page under its heading. A panel never stands inside a panel: use `look="open"` there. */
export function Panel({
  title,
  aside,
  actions,
  id,
  look = "sheet",
  headingLevel = 2,
  className = "",
  children,
}: PanelProps) {
  const Heading = headingLevel === 2 ? "h2" : "h3";
  const frame =
    look === "sheet" ? "panel min-w-0 border border-rule bg-sheet px-4 py-4 sm:px-5" : "panel min-w-0";
  return (
    <section
      id={id}
      aria-labelledby={id && title ? `${id}-title` : undefined}
      className={`${frame} ${className}`}
    >
      {title !== undefined && (
        <div
          className={`flex flex-wrap items-baseline gap-x-3 gap-y-1 ${look === "open" ? "border-b border-rule pb-2" : ""} mb-3`}
        >
          <Heading id={id ? `${id}-title` : undefined}>{title}</Heading>
          {aside !== undefined && <span className="text-sm text-ink-3">{aside}</span>}
          {actions !== undefined && <span className="ml-auto flex flex-wrap gap-2">{actions}</span>}
        </div>
      )}
      {children}
    </section>
  );
}
