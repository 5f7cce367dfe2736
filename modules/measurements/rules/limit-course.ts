import { localToEpoch } from "@/lib/zone";
import type { Bounds, LimitShape, LimitVersion } from "../model";
import { boundsAt, dayOfYearMs, versionInForce } from "./limits-at";

/** How the limits ran over a stretch of time in which nothing but a straight line happened to them. */
export type LimitStretch =
  | {
      readonly state: "in-force";
      readonly version: number;
      readonly fromAt: number;
      readonly toAt: number;
      readonly start: Bounds;
      /** What `start` has become by `toAt`; the same names, linear in between. */
      readonly end: Bounds;
    }
  | {
      readonly state: "suspended";
      readonly version: number;
      readonly fromAt: number;
      readonly toAt: number;
      readonly reason: string;
    };

/** The moments between `fromAt` and `toAt` at which a shape bends: a ramp's knots, a season's days of every year. */
function bendsOf(shape: LimitShape, fromAt: number, toAt: number, zone: string): number[] {
  switch (shape.kind) {
    case "constant":
      return [];
    case "ramp":
      return shape.knots.map((knot) => knot.at);
    case "season": {
      const first = new Date(fromAt).getUTCFullYear() - 1;
      const last = new Date(toAt).getUTCFullYear() + 1;
      const years = Array.from({ length: last - first + 1 }, (_, index) => first + index);
      return years.flatMap((year) =>
        shape.knots.map((knot) => midnightOf(dayOfYearMs(knot.monthDay, year), zone)),
      );
    }
  }
}

/** Midnight of a day in a zone; where the clock left midnight out, the moment it jumped. `wallMs` counts wall time as UTC. */
function midnightOf(wallMs: number, zone: string): number {
  const on = new Date(wallMs).toISOString().slice(0, 10);
  const read = localToEpoch({ on, at: "00:00", zone, disambiguation: "earlier" });
  return read.kind === "one" ? read.epochMs : read.later.epochMs;
}

/** Bounds at the end of a stretch under the names they had at its start: what a single knot states goes on as stated. */
function endOf(shape: LimitShape, start: Bounds, toAt: number, zone: string): Bounds {
  const there = boundsAt(shape, toAt, zone);
  return Object.fromEntries(
    Object.entries(start).map(([name, value]) => [name, there[name as keyof Bounds] ?? value]),
  );
}

/**
 * How did the limits run between two moments, as straight pieces that a chart can draw? Cut where a version begins or
 * ends and where a ramp or a season bends. No piece where nothing was in force; a suspended piece has its reason.
 * Within a season's piece the clock change of an hour is not followed (under a hundredth of the piece).
 * @throws RangeError for a shape without knots, as `boundsAt`
 * @example limitCourse([{ id: 1, version: 1, effectiveFromAt: 0, effectiveToAt: null, suspended: null,
 *   shape: { kind: "constant", bounds: { toleranceHigh: 18 } } }], -5, 10, "UTC")
 *   // => [{ state: "in-force", version: 1, fromAt: 0, toAt: 10, start: { toleranceHigh: 18 }, end: { toleranceHigh: 18 } }]
 */
export function limitCourse(
  versions: readonly LimitVersion[],
  fromAt: number,
  toAt: number,
  zone: string,
): LimitStretch[] {
  const inside = (at: number | null): at is number => at !== null && at > fromAt && at < toAt;
  const cuts = versions.flatMap((each) => [
    each.effectiveFromAt,
    each.effectiveToAt,
    ...bendsOf(each.shape, fromAt, toAt, zone),
  ]);
  const edges = [...new Set([fromAt, ...cuts.filter(inside), toAt])].sort((a, b) => a - b);
  const pieces = edges.slice(1).flatMap((end, index): LimitStretch[] => {
    const begin = edges[index] as number;
    const found = versionInForce(versions, begin);
    if (!found) return [];
    const span = { version: found.version, fromAt: begin, toAt: end };
    if (found.suspended) return [{ state: "suspended", ...span, reason: found.suspended.reason }];
    const start = boundsAt(found.shape, begin, zone);
    return [{ state: "in-force", ...span, start, end: endOf(found.shape, start, end, zone) }];
  });
  return pieces.reduce(joinLevel, []);
}

const isLevel = (piece: LimitStretch): boolean =>
  piece.state === "suspended" || JSON.stringify(piece.start) === JSON.stringify(piece.end);

/** Two level pieces of one version side by side are one. */
function joinLevel(done: LimitStretch[], piece: LimitStretch): LimitStretch[] {
  const last = done.at(-1);
  const goesOn =
    last !== undefined &&
    last.version === piece.version &&
    last.state === piece.state &&
    last.toAt === piece.fromAt &&
    isLevel(last) &&
    isLevel(piece) &&
    (last.state === "suspended" ||
      piece.state === "suspended" ||
      JSON.stringify(last.end) === JSON.stringify(piece.start));
  return goesOn ? [...done.slice(0, -1), { ...last, toAt: piece.toAt }] : [...done, piece];
}
