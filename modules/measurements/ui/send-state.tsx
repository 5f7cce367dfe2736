"use client";
import { Button, timeText } from "@/lib/ui";
import { countOutbox, type OutboxState } from "./outbox";

interface SendStateProps {
  state: OutboxState;
  /** How many values wait for the person (to be confirmed or mended). */
  waiting: number;
  zone: string;
  onRetry: () => void;
}

/** "84 sent · 3 wait for you · 0 not sent", and why where something is stuck. Read out as it changes. */
export function SendState({ state, waiting, zone, onRetry }: SendStateProps) {
  const { sent, moving, notSent } = countOutbox(state);
  const stuck = notSent > 0;
  return (
    <div
      className={`flex min-h-12 flex-wrap items-center gap-x-3 gap-y-1 rounded-sm border px-3 py-1.5 ${stuck ? "border-watch-mark bg-sheet" : "border-transparent"}`}
    >
      <p role="status" className="tabular-nums">
        <span>{sent} sent</span>
        <span aria-hidden="true"> · </span>
        <span className={waiting > 0 ? "font-semibold" : ""}>
          {waiting} {waiting === 1 ? "waits" : "wait"} for you
        </span>
        <span aria-hidden="true"> · </span>
        <span className={stuck ? "font-semibold text-watch" : ""}>{notSent} not sent</span>
        {moving > 0 && <span className="text-ink-3"> · {moving} on the way</span>}
      </p>
      {state.signedOut ? (
        <p className="text-sm">
          Your session has ended; what you entered is kept here.{" "}
          <a href="/sign-in" target="_blank" rel="noreferrer" className="link">
            Sign in in a new tab
          </a>
          , then send it again.
        </p>
      ) : (
        state.stuckSince !== null && (
          <p className="text-sm text-ink-2">
            nothing gets through since {timeText(state.stuckSince, zone, "time")}; it is tried again by itself
          </p>
        )
      )}
      {(state.signedOut || state.stuckSince !== null) && (
        <Button size="small" onClick={onRetry}>
          Send now
        </Button>
      )}
    </div>
  );
}
