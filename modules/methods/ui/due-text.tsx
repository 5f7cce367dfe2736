import { timeText } from "@/lib/ui";
import type { InstrumentRow } from "../model";

const day = (on: string) => timeText(Date.parse(`${on}T12:00:00Z`), "UTC", "day");

/** When an instrument's next check is due, in words; what is missing stands out, by word and weight. */
export function DueText({ instrument: { due, state } }: { instrument: InstrumentRow }) {
  if (state === "retired") return <span className="text-ink-3">retired</span>;
  switch (due.state) {
    case "not-checked-by-date":
      return <span className="text-ink-3">no date</span>;
    case "never-checked":
      return <span className="font-semibold text-watch">never checked</span>;
    case "failed":
      return <span className="font-semibold text-out">the last check failed</span>;
    case "overdue":
      return (
        <span className="font-semibold text-watch">
          overdue since {due.dueOn === null ? "" : day(due.dueOn)}
        </span>
      );
    case "due":
      return <>{due.dueOn === null ? "" : day(due.dueOn)}</>;
  }
}
