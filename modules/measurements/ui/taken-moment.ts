import { localToEpoch } from "@/lib/zone";

/** What a "taken at" field says. */
export type TakenMoment =
  | { readonly ok: true; readonly at: number | null }
  /** The clock showed it twice; a person says which. */
  | { readonly ok: false; readonly kind: "doubled"; readonly sentence: string }
  | { readonly ok: false; readonly kind: "wrong"; readonly sentence: string };

/** Clocks of tablets run a little ahead; the server allows five minutes too. */
const SLACK_MS = 5 * 60_000;

/**
 * Which moment does "YYYY-MM-DDTHH:mm" mean in the facility's zone? Empty means now (null). The hour that the clock shows
 * twice in autumn is asked about, the one it leaves out in spring and the future are refused.
 * @example readTakenAt("", "Europe/London", now, null) // { ok: true, at: null }
 */
export function readTakenAt(
  text: string,
  zone: string,
  now: number,
  which: "earlier" | "later" | null,
): TakenMoment {
  if (text === "") return { ok: true, at: null };
  const [on = "", at = ""] = text.split("T");
  try {
    const read = localToEpoch({ on, at, zone, ...(which ? { disambiguation: which } : {}) });
    if (read.kind === "doubled") {
      return {
        ok: false,
        kind: "doubled",
        sentence: "The clock showed this time twice. Say which of the two it was.",
      };
    }
    if (read.kind === "missing") {
      return {
        ok: false,
        kind: "wrong",
        sentence: "The clock left this time out when it went forward. Set another.",
      };
    }
    if (read.epochMs > now + SLACK_MS) {
      return {
        ok: false,
        kind: "wrong",
        sentence: "This lies in the future. Say when the reading was taken.",
      };
    }
    return { ok: true, at: read.epochMs };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return { ok: false, kind: "wrong", sentence: "Set both the day and the time." };
  }
}
