import type { BandSegment, ChartMark, ChartPoint, ControlSegment } from "@/lib/ui/line-chart-model";
import type { Qualifier } from "../model";
import { type Baseline, type BeyondControl, beyondControl, controlBaseline } from "../rules/control-baseline";
import type { LimitStretch } from "../rules/limit-course";
import type { SeriesReading } from "../series-model";

const QUALIFIER_WORDS: Readonly<Record<Qualifier, string | null>> = {
  "": null,
  "<": "less than this",
  ">": "more than this",
  ND: "not detected",
};

/** Words said of a point beside its status, and the reason for its hollow circle. */
function kindOf({ isCorrected, qualifier }: SeriesReading): string | undefined {
  const words = [QUALIFIER_WORDS[qualifier], isCorrected ? "corrected" : null].filter(
    (each) => each !== null,
  );
  return words.length > 0 ? words.join(", ") : undefined;
}

/** More squares than this hide the line they stand on. */
export const MOST_FLAGS = 100;

/** The readings that can be drawn: those with a number. What is beyond a control limit is flagged, unless too much is. */
export function chartPoints(
  readings: readonly SeriesReading[],
  beyond: readonly BeyondControl[],
): ChartPoint[] {
  const flagged = beyond.length > MOST_FLAGS ? [] : beyond;
  const flags = new Map(flagged.map((each) => [each.index, each.side]));
  return readings.flatMap((reading, index): ChartPoint[] => {
    if (reading.value === null) return [];
    const kind = kindOf(reading);
    const side = flags.get(index);
    const { side: direction } = reading;
    return [
      {
        at: reading.at,
        value: reading.value,
        status: reading.status,
        ...(direction === "low" || direction === "high" ? { direction } : {}),
        ...(kind === undefined ? {} : { kind }),
        ...(side === undefined ? {} : { flag: `beyond the ${side} control limit` }),
      },
    ];
  });
}

/** The course of the limits as the chart draws it; suspended stretches stay bare. */
export function chartBand(course: readonly LimitStretch[]): BandSegment[] {
  return course.flatMap((piece): BandSegment[] => {
    if (piece.state !== "in-force") return [];
    const { start, end } = piece;
    return [
      {
        from: piece.fromAt,
        to: piece.toAt,
        low: start.toleranceLow ?? null,
        high: start.toleranceHigh ?? null,
        lowAtEnd: end.toleranceLow ?? null,
        highAtEnd: end.toleranceHigh ?? null,
        watchLow: start.watchLow ?? null,
        watchHigh: start.watchHigh ?? null,
        watchLowAtEnd: end.watchLow ?? null,
        watchHighAtEnd: end.watchHigh ?? null,
      },
    ];
  });
}

/** Names by id, for what changed along the way. */
export interface ChangeNames {
  readonly methods: ReadonlyMap<number, string>;
  readonly instruments: ReadonlyMap<number, string>;
}

/** More marks than this hide the line; notes give way first, then instruments, then methods. */
const MOST_MARKS = 40;
const LONGEST_NOTE = 26;

function changes(
  readings: readonly SeriesReading[],
  idOf: (reading: SeriesReading) => number | null,
  words: (id: number) => string,
): ChartMark[] {
  let now: number | null = null;
  return readings.flatMap((reading) => {
    const id = idOf(reading);
    if (id === null || id === now) return [];
    const isFirst = now === null;
    now = id;
    return isFirst ? [] : [{ at: reading.at, label: words(id) }];
  });
}

function limitMarks(course: readonly LimitStretch[]): ChartMark[] {
  return course.flatMap((piece, index): ChartMark[] => {
    const before = course[index - 1];
    if (index === 0 || before?.version === piece.version) return [];
    const label = piece.state === "suspended" ? "limits suspended" : `limits, version ${piece.version}`;
    return [{ at: piece.fromAt, label }];
  });
}

const shortened = (text: string): string =>
  text.length > LONGEST_NOTE ? `${text.slice(0, LONGEST_NOTE - 1).trimEnd()}…` : text;

/** The marks of a chart in the order of time, and which kinds of them were too many to be drawn. */
export interface SeriesMarks {
  readonly marks: readonly ChartMark[];
  readonly leftOut: readonly string[];
}

/** What happened along a series: incidents, new limits, changes of method and instrument, notes. */
export function seriesMarks(
  readings: readonly SeriesReading[],
  course: readonly LimitStretch[],
  names: ChangeNames,
  incidents: readonly ChartMark[],
): SeriesMarks {
  const nameOf = (known: ReadonlyMap<number, string>, id: number) => known.get(id) ?? `number ${id}`;
  const groups: readonly (readonly [string, readonly ChartMark[]])[] = [
    ["incidents", incidents],
    ["versions of the limits", limitMarks(course)],
    [
      "changes of method",
      changes(
        readings,
        (each) => each.methodId,
        (id) => `method ${nameOf(names.methods, id)}`,
      ),
    ],
    [
      "changes of instrument",
      changes(
        readings,
        (each) => each.instrumentId,
        (id) => `instrument ${nameOf(names.instruments, id)}`,
      ),
    ],
    ["notes", readings.flatMap(({ at, note }) => (note === null ? [] : [{ at, label: shortened(note) }]))],
  ];
  const marks: ChartMark[] = [];
  const leftOut: string[] = [];
  for (const [what, of] of groups) {
    if (marks.length + of.length <= MOST_MARKS) marks.push(...of);
    else leftOut.push(`${of.length} ${what}`);
  }
  return { marks: marks.sort((a, b) => a.at - b.at), leftOut };
}

/** Control limits of a baseline over a series, and what lies beyond them. */
export interface SeriesControl {
  readonly baseline: Baseline;
  readonly beyond: readonly BeyondControl[];
  readonly segments: readonly ControlSegment[];
}

/** Control limits from a baseline, held against everything from its beginning on. */
export function seriesControl(
  readings: readonly SeriesReading[],
  fromAt: number,
  toAt: number,
): SeriesControl {
  const baseline = controlBaseline(readings, fromAt, toAt);
  const last = readings.at(-1);
  if (!baseline.ok || last === undefined) return { baseline, beyond: [], segments: [] };
  const { centre, lower, upper } = baseline.limits;
  return {
    baseline,
    beyond: beyondControl(readings, baseline.limits).filter(
      ({ index }) => (readings[index]?.at ?? 0) >= fromAt,
    ),
    segments: [{ from: fromAt, to: last.at, centre, lower, upper }],
  };
}
