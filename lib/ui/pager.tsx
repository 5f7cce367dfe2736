import { LinkButton } from "./button";

export interface PagerProps {
  /** Addresses of the neighbouring pages; a missing one means there is none. */
  newerHref?: string | null;
  olderHref?: string | null;
  newerText?: string;
  olderText?: string;
  /** What is shown: "50 entries, 3 to 9 July". */
  summary?: string;
}

/** Steps through a long list by its order (keyset), so that nothing is skipped when rows are added meanwhile. */
export function Pager({
  newerHref,
  olderHref,
  newerText = "Newer",
  olderText = "Older",
  summary,
}: PagerProps) {
  if (!newerHref && !olderHref && !summary) return null;
  return (
    <nav aria-label="Pages" className="flex flex-wrap items-center gap-3 pt-3">
      {newerHref ? (
        <LinkButton href={newerHref} size="small" rel="prev">
          {newerText}
        </LinkButton>
      ) : null}
      {summary !== undefined && <span className="text-sm text-ink-2">{summary}</span>}
      {olderHref ? (
        <LinkButton href={olderHref} size="small" rel="next" className="ml-auto">
          {olderText}
        </LinkButton>
      ) : null}
    </nav>
  );
}
