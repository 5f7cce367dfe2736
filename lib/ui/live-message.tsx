"use client";
import { createContext, type ReactNode, useCallback, useContext, useEffect, useState } from "react";

export interface LiveMessageValue {
  text: string;
  /** `done` goes by itself; `trouble` stays until it is closed. */
  kind?: "done" | "trouble";
}

const LiveContext = createContext<(message: LiveMessageValue) => void>(() => undefined);

/** Says something at the foot of the page and to assistive technology: `say({ text: "Stored." })`. */
export function useLiveMessage(): (message: LiveMessageValue) => void {
  return useContext(LiveContext);
}

const STAYS_MS = 8_000;

/** Holds the one live message of the page. Nothing that must be read stands only here. */
export function LiveMessageProvider({ children }: { children: ReactNode }) {
  const [message, setMessage] = useState<LiveMessageValue | null>(null);
  const say = useCallback((next: LiveMessageValue) => setMessage({ ...next }), []);
  useEffect(() => {
    if (message === null || message.kind === "trouble") return;
    const timer = setTimeout(() => setMessage(null), STAYS_MS);
    return () => clearTimeout(timer);
  }, [message]);
  return (
    <LiveContext value={say}>
      {children}
      <LiveMessage message={message} onClose={() => setMessage(null)} />
    </LiveContext>
  );
}

/** The message itself, for a place that keeps its own state. The live region is always there, or it would not be heard. */
export function LiveMessage({ message, onClose }: { message: LiveMessageValue | null; onClose: () => void }) {
  const trouble = message?.kind === "trouble";
  return (
    <div className="live-place">
      <div aria-live={trouble ? "assertive" : "polite"} role={trouble ? "alert" : "status"}>
        {message !== null && (
          <div className={`live-box ${trouble ? "border-out-mark" : "border-ink"}`}>
            <span className={trouble ? "font-semibold text-out" : ""}>{message.text}</span>
            <button type="button" className="btn" data-variant="quiet" data-size="small" onClick={onClose}>
              Close
            </button>
          </div>
        )}
      </div>
    </div>
  );
}
