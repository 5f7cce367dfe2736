import { LinkButton } from "@/lib/ui";
import { weekdayWords } from "./sheet-words";

/** To the operational day before and after; none after today. */
export function DaySteps({
  before,
  after,
  hrefOf,
}: {
  before: string;
  after: string | null;
  hrefOf: (on: string) => string;
}) {
  return (
    <nav aria-label="Days" className="flex flex-wrap gap-2.5 print:hidden">
      <LinkButton size="small" href={hrefOf(before)}>
        <span aria-hidden="true">←</span> {weekdayWords(before)}
      </LinkButton>
      {after !== null && (
        <LinkButton size="small" href={hrefOf(after)}>
          {weekdayWords(after)} <span aria-hidden="true">→</span>
        </LinkButton>
      )}
    </nav>
  );
}
