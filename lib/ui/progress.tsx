export interface ProgressProps {
  /** What is being done. */
  label: string;
  done: number;
  /** Unknown when left out: the bar then shows only that work goes on. */
  total?: number;
  /** Said after the figures: "rows read". */
  noun?: string;
}

/** Long work that can be left: a tube that fills, and the figures beside it. */
export function Progress({ label, done, total, noun = "" }: ProgressProps) {
  const share = total === undefined || total <= 0 ? undefined : Math.min(1, Math.max(0, done / total));
  const figures = total === undefined ? `${done}` : `${done} of ${total}`;
  return (
    <div>
      <div className="mb-1 flex justify-between gap-3 text-[0.9375rem]">
        <span className="font-semibold">{label}</span>
        <span className="num text-sm text-ink-2">
          {figures} {noun}
        </span>
      </div>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={total}
        aria-valuenow={share === undefined ? undefined : done}
        aria-valuetext={`${figures} ${noun}`.trim()}
        className="h-3 overflow-hidden rounded-full border border-edge bg-field"
      >
        <div
          className={`h-full bg-water ${share === undefined ? "progress-waiting" : ""}`}
          style={{ width: share === undefined ? "30%" : `${100 * share}%` }}
        />
      </div>
    </div>
  );
}

export interface StepsProps {
  total: number;
  /** Counting from 0; those before it are done. */
  current: number;
  label: string;
}

/** Where in a walk of a few stations you are. */
export function Steps({ total, current, label }: StepsProps) {
  return (
    <div role="img" aria-label={`${label}: ${current + 1} of ${total}`} className="flex gap-1">
      {Array.from({ length: total }, (_, index) => (
        <span
          key={index}
          className={`h-1.5 flex-1 rounded-sm border ${
            index === current
              ? "border-water bg-water"
              : index < current
                ? "border-edge bg-edge"
                : "border-edge"
          }`}
        />
      ))}
    </div>
  );
}
