import "server-only";
import { MINUTE_MS } from "@/lib/clock";
import { settings } from "@/lib/env";
import { localToEpoch } from "@/lib/zone";

const TYPED = /^(\d{4}-\d{2}-\d{2})T(\d{2}:\d{2})(:\d{2})?/;

/**
 * A moment typed as the facility's clock shows it. Without seconds the whole minute is meant, up to its last millisecond; an
 * hour that the clock showed twice is its second one.
 */
export function readMoment(text: string): { at: number | null; text: string; problem?: string } {
  if (text === "") return { at: null, text };
  const [, on = "", minutes = "", seconds] = TYPED.exec(text) ?? [];
  try {
    const zone = settings().STILLWELL_ZONE;
    const read = localToEpoch({ on, at: `${minutes}${seconds ?? ""}`, zone, disambiguation: "later" });
    if (read.kind === "one") return { at: read.epochMs + (seconds ? 999 : MINUTE_MS - 1), text };
    return { at: null, text, problem: "The clock never showed this time: it went forward over it." };
  } catch {
    return { at: null, text: "", problem: "This is no day and time; choose both." };
  }
}
