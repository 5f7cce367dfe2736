import { type TimeParts, timeText } from "./time-words";

export interface TimeTextProps {
  /** UTC epoch milliseconds. */
  at: number;
  /** The facility's zone, an IANA name ("Europe/London"). */
  zone: string;
  show?: TimeParts;
  className?: string;
}

/** A moment in the facility's zone; the full ISO time stands in `datetime` and in the title. */
export function TimeText({ at, zone, show = "day-time", className = "" }: TimeTextProps) {
  const iso = new Date(at).toISOString();
  return (
    <time
      dateTime={iso}
      title={`${iso} (UTC), shown for ${zone}`}
      className={`tabular-nums whitespace-nowrap ${className}`}
    >
      {timeText(at, zone, show)}
    </time>
  );
}
