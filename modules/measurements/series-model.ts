import type { FacilityParameter } from "@/modules/methods/model";
import type { Qualifier, Side, Status } from "./model";
import type { LimitStretch } from "./rules/limit-course";

/** What stands around a series: where, of what, and how its limits ran. */
export interface SeriesFrame {
  readonly pointId: number;
  readonly pointName: string;
  readonly isDefaultPoint: boolean;
  readonly systemCode: string;
  readonly parameter: FacilityParameter;
  /** When the first reading in force was taken; null where there is none. */
  readonly firstAt: number | null;
  readonly fromAt: number;
  readonly toAt: number;
  readonly course: readonly LimitStretch[];
}

/** What most readings do not have. */
export interface SeriesMore {
  readonly side?: Side;
  readonly qualifier?: Qualifier;
  readonly isCorrected?: boolean;
  readonly answer?: string;
  readonly typedText?: string;
  readonly note?: string;
}

/** Readings in the order of time, column by column; `more` by index. `next` asks for the following slice. */
export interface SeriesSlice {
  readonly ids: readonly number[];
  readonly at: readonly number[];
  readonly values: readonly (number | null)[];
  readonly statuses: readonly Status[];
  readonly takenBy: readonly number[];
  readonly methodIds: readonly (number | null)[];
  readonly instrumentIds: readonly (number | null)[];
  readonly more: Record<number, SeriesMore>;
  readonly next: { readonly afterAt: number; readonly afterId: number } | null;
}

/** One reading of a series as a chart and its table show it. */
export interface SeriesReading {
  readonly id: number;
  readonly at: number;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly status: Status;
  readonly side: Side | null;
  readonly isCorrected: boolean;
  readonly answer: string | null;
  readonly typedText: string;
  readonly takenBy: number;
  readonly methodId: number | null;
  readonly instrumentId: number | null;
  readonly note: string | null;
}

/** The readings of a slice, one by one. */
export function sliceReadings(slice: SeriesSlice): SeriesReading[] {
  return slice.ids.map((id, index) => {
    const more: SeriesMore = slice.more[index] ?? {};
    return {
      id,
      at: slice.at[index] ?? 0,
      value: slice.values[index] ?? null,
      qualifier: more.qualifier ?? "",
      status: slice.statuses[index] ?? "none",
      side: more.side ?? null,
      isCorrected: more.isCorrected ?? false,
      answer: more.answer ?? null,
      typedText: more.typedText ?? "",
      takenBy: slice.takenBy[index] ?? 0,
      methodId: slice.methodIds[index] ?? null,
      instrumentId: slice.instrumentIds[index] ?? null,
      note: more.note ?? null,
    };
  });
}

/** How one series did over the last days, for choosing a chart. */
export interface SeriesSummary {
  readonly pointId: number;
  readonly parameterId: number;
  /** Share of the known time within tolerance, 0 to 1; null where nothing is known. */
  readonly within: number | null;
  readonly out: number;
  readonly readings: number;
}
