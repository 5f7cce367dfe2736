/** The judgement of a value: within, watch, out of tolerance, implausible, cannot be judged, no limits. */
export type StatusCode = "within" | "watch" | "out" | "implausible" | "unjudged" | "none";
export type StatusDirection = "high" | "low" | null;

export const STATUS_WORDS: Record<StatusCode, string> = {
  within: "within",
  watch: "watch",
  out: "out of tolerance",
  implausible: "implausible",
  unjudged: "cannot be judged",
  none: "no limits",
};

const TONE: Record<StatusCode, string> = {
  within: "text-ink-3",
  watch: "font-semibold text-watch",
  out: "font-semibold text-out",
  implausible: "font-semibold text-odd",
  unjudged: "text-ink-2",
  none: "text-ink-3",
};

export interface StatusWordProps {
  status: StatusCode;
  /** The way the value went: a triangle points there. */
  direction?: StatusDirection;
  /** Said after the word: "below 6.5". */
  detail?: string;
  /** Says nothing when all is well (the word stays for assistive technology). */
  quietWhenWithin?: boolean;
  className?: string;
}

/** A status as shape and word; colour only adds to them, and "within" has none. */
export function StatusWord({
  status,
  direction = null,
  detail,
  quietWhenWithin = false,
  className = "",
}: StatusWordProps) {
  const word = STATUS_WORDS[status];
  if (status === "within" && quietWhenWithin) return <span className="sr-only">{word}</span>;
  return (
    <span className={`inline-flex items-baseline gap-[0.4em] whitespace-nowrap ${TONE[status]} ${className}`}>
      <StatusShape status={status} direction={direction} />
      <span
        className={status === "implausible" ? "border-b-[1.5px] border-dashed border-odd-mark" : undefined}
      >
        {word}
      </span>
      {detail !== undefined && <span className="font-normal whitespace-normal">{detail}</span>}
    </span>
  );
}

const SHAPES: Partial<Record<StatusCode, string>> = {
  watch: "M5 0.2L9.8 5L5 9.8L0.2 5Z",
  out: "M0.8 0.8H9.2V9.2H0.8Z",
};

/** The shape alone: diamond for watch, triangle the way the value went for out, dashed ring for implausible. */
export function StatusShape({
  status,
  direction = null,
}: {
  status: StatusCode;
  direction?: StatusDirection;
}) {
  if (status === "within" || status === "none") return null;
  const triangle = direction === "high" ? "M5 0.5L9.9 9.3H0.1Z" : "M5 9.5L0.1 0.7H9.9Z";
  const path = status === "out" && direction !== null ? triangle : SHAPES[status];
  const tone = status === "watch" ? "fill-watch-mark" : "fill-out-mark";
  return (
    <svg width="0.72em" height="0.72em" viewBox="0 0 10 10" aria-hidden="true" className="flex-none">
      {path !== undefined && <path d={path} className={tone} />}
      {status === "implausible" && (
        <circle
          cx="5"
          cy="5"
          r="4"
          fill="none"
          className="stroke-odd-mark"
          strokeWidth="1.8"
          strokeDasharray="2.4 1.8"
        />
      )}
      {status === "unjudged" && (
        <circle cx="5" cy="5" r="4" fill="none" className="stroke-ink-3" strokeWidth="1.5" />
      )}
    </svg>
  );
}
