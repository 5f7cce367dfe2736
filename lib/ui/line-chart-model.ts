import { numberText } from "./number-text";
import { STATUS_WORDS, type StatusCode, type StatusDirection } from "./status-word";
import { timeText } from "./time-words";

export interface ChartPoint {
  /** UTC epoch milliseconds. */
  at: number;
  value: number;
  status?: StatusCode;
  direction?: StatusDirection;
  /** How it came about, said in the reading-out ("corrected", "less than"); drawn as a hollow circle. */
  kind?: string;
  /** A rule met at this point; drawn as a hollow square around it. */
  flag?: string;
}

/** The tolerance over a stretch of time and the watch limits inside it; `…AtEnd` makes a ramp, a missing side is open. */
export interface BandSegment {
  from: number;
  to: number;
  low?: number | null;
  high?: number | null;
  lowAtEnd?: number | null;
  highAtEnd?: number | null;
  watchLow?: number | null;
  watchHigh?: number | null;
  watchLowAtEnd?: number | null;
  watchHighAtEnd?: number | null;
}

/** Statistical lines over a stretch of time; never confused with tolerance: dashed, in the colour of water. */
export interface ControlSegment {
  from: number;
  to: number;
  centre?: number | null;
  lower?: number | null;
  upper?: number | null;
}

/** Something that happened: a vertical line with its words. */
export interface ChartMark {
  at: number;
  label: string;
}

export interface ChartData {
  points: readonly ChartPoint[];
  band?: readonly BandSegment[];
  control?: readonly ControlSegment[];
  marks?: readonly ChartMark[];
}

/** Must a point be drawn, however many neighbours it has? */
export function isTelling(point: ChartPoint): boolean {
  const { status, flag, kind } = point;
  return (
    flag !== undefined ||
    kind !== undefined ||
    status === "watch" ||
    status === "out" ||
    status === "implausible"
  );
}

/** The values the chart's height must hold; implausible points do not stretch it (they stand at the edge instead). */
export function valueRange({ points, band = [], control = [] }: ChartData): [number, number] {
  const values = [
    ...points.filter((p) => p.status !== "implausible").map((p) => p.value),
    ...band.flatMap((s) => [s.low, s.high, s.lowAtEnd, s.highAtEnd]),
    ...band.flatMap((s) => [s.watchLow, s.watchHigh, s.watchLowAtEnd, s.watchHighAtEnd]),
    ...control.flatMap((s) => [s.centre, s.lower, s.upper]),
  ].filter((x) => x !== null && x !== undefined);
  if (values.length === 0) return [0, 1];
  let [lowest, highest] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const x of values) {
    lowest = Math.min(lowest, x);
    highest = Math.max(highest, x);
  }
  const room = (highest - lowest) * 0.08 || Math.abs(highest) * 0.05 || 1;
  return [lowest - room, highest + room];
}

/** The stretch of time the chart holds. */
export function timeRange({ points, marks = [] }: ChartData): [number, number] {
  const first = points[0]?.at ?? marks[0]?.at ?? 0;
  const last = points.at(-1)?.at ?? first + 1;
  return first === last ? [first - 43_200_000, last + 43_200_000] : [first, last];
}

export interface ChartWords {
  title: string;
  unit: string;
  decimals: number;
  zone: string;
}

/** One point in words, for the pointer's note and for reading out. */
export function pointText(point: ChartPoint, words: ChartWords): string {
  const unit = words.unit === "" ? "" : ` ${words.unit}`;
  const status = point.status === undefined || point.status === "within" ? null : STATUS_WORDS[point.status];
  const head = `${timeText(point.at, words.zone, "day-time")}: ${numberText(point.value, words.decimals)}${unit}`;
  return [head, status, point.kind, point.flag].filter(Boolean).join(", ");
}

/** The whole chart in two sentences: how many points, from when to when, lowest, highest, how many are off. */
export function chartText(data: ChartData, words: ChartWords): string {
  const { points } = data;
  if (points.length === 0) return `${words.title}: no points in this stretch of time.`;
  const [from, to] = timeRange(data);
  let low = points[0] as ChartPoint;
  let high = low;
  const off = new Map<StatusCode, number>();
  for (const point of points) {
    if (point.value < low.value) low = point;
    if (point.value > high.value) high = point;
    if (point.status !== undefined) off.set(point.status, (off.get(point.status) ?? 0) + 1);
  }
  const counts = (["watch", "out", "implausible"] as const)
    .filter((status) => off.has(status))
    .map((status) => `${off.get(status)} ${STATUS_WORDS[status]}`);
  const unit = words.unit === "" ? "" : ` ${words.unit}`;
  const span = `${points.length} points from ${timeText(from, words.zone, "day")} to ${timeText(to, words.zone, "day")}`;
  const range = `lowest ${numberText(low.value, words.decimals)}, highest ${numberText(high.value, words.decimals)}${unit}`;
  const happened = (data.marks ?? []).map((mark) => `${timeText(mark.at, words.zone, "day")} ${mark.label}`);
  const marks = happened.length > 0 ? ` Marks: ${happened.join("; ")}.` : "";
  return `${words.title}: ${span}, ${range}. ${counts.length > 0 ? `${counts.join(", ")}.` : "None watch or out of tolerance."}${marks}`;
}

/**
 * Where do labels stand that must not touch? Keeps their order, moves them as little as a downward sweep needs.
 * @example spread([10, 12, 40], 14) // [10, 24, 40]
 */
export function spread(wanted: readonly number[], gap: number): number[] {
  const order = wanted.map((y, index) => ({ y, index })).sort((a, b) => a.y - b.y);
  const placed = new Array<number>(wanted.length);
  let floor = Number.NEGATIVE_INFINITY;
  for (const { y, index } of order) {
    const at = Math.max(y, floor + gap);
    placed[index] = at;
    floor = at;
  }
  return placed;
}
