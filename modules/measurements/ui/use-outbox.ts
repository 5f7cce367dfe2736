"use client";
import { useEffect, useMemo, useSyncExternalStore } from "react";
import { systemClock } from "@/lib/clock";
import { countOutbox, Outbox, type OutboxState } from "./outbox";

const BOXES = new Map<number, Outbox>();
const NOTHING: OutboxState = { items: [], stuckSince: null, signedOut: false };

function tabStore(): Storage | null {
  try {
    return window.sessionStorage;
  } catch {
    // forbidden by the browser's settings: values are kept in the page alone
    return null;
  }
}

/** The one outbox of a person in this tab; it goes on working while they walk from page to page. */
function outboxOf(personId: number): Outbox {
  const known = BOXES.get(personId);
  if (known) return known;
  const fresh = new Outbox({
    personId,
    keep: typeof window === "undefined" ? null : tabStore(),
    now: () => systemClock.now(),
    later: (run, ms) => {
      const timer = setTimeout(run, ms);
      return () => clearTimeout(timer);
    },
  });
  if (typeof window !== "undefined") BOXES.set(personId, fresh);
  return fresh;
}

/**
 * What was typed and handed over on this device, and its way to the server. Tries again when the network is back or the page
 * is looked at again; asks before the page is closed while something is not stored.
 */
export function useOutbox(personId: number): { outbox: Outbox; state: OutboxState } {
  const outbox = useMemo(() => outboxOf(personId), [personId]);
  const state = useSyncExternalStore(outbox.subscribe, outbox.snapshot, () => NOTHING);

  useEffect(() => {
    const again = () => document.visibilityState === "visible" && outbox.retry();
    const ask = (event: BeforeUnloadEvent) => {
      const { moving, notSent } = countOutbox(outbox.snapshot());
      if (moving + notSent > 0) event.preventDefault();
    };
    outbox.forgetSent();
    outbox.retry();
    window.addEventListener("online", outbox.retry);
    document.addEventListener("visibilitychange", again);
    window.addEventListener("beforeunload", ask);
    return () => {
      window.removeEventListener("online", outbox.retry);
      document.removeEventListener("visibilitychange", again);
      window.removeEventListener("beforeunload", ask);
    };
  }, [outbox]);
  return { outbox, state };
}
