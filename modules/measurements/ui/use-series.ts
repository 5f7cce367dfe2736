"use client";
import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { fetchJson } from "@/lib/ui";
import { type SeriesReading, type SeriesSlice, sliceReadings } from "../series-model";

/** Which series, and from when until when (half-open, UTC epoch ms). */
export interface SeriesSpan {
  readonly pointId: number;
  readonly parameterId: number;
  readonly fromAt: number;
  readonly toAt: number;
}

/** The address of a series' readings, as JSON or as a file. */
export function seriesHref(
  span: SeriesSpan,
  kind: "json" | "csv",
  after: SeriesSlice["next"] = null,
): string {
  const search = new URLSearchParams(
    Object.entries({ ...span, ...after }).map(([name, value]) => [name, String(value)]),
  );
  return `/api/v1/series${kind === "csv" ? "/csv" : ""}?${search}`;
}

async function loadSeries(span: SeriesSpan, signal: AbortSignal, onLoaded: (count: number) => void) {
  const readings: SeriesReading[] = [];
  let after: SeriesSlice["next"] = null;
  do {
    const href: string = seriesHref(span, "json", after);
    const { data }: { data: SeriesSlice } = await fetchJson(href, signal);
    for (const reading of sliceReadings(data)) readings.push(reading);
    after = data.next;
    if (after) onLoaded(readings.length);
  } while (after);
  return readings;
}

/** The readings of a series, fetched slice by slice; `loaded` counts them while more are coming. */
export function useSeries(span: SeriesSpan) {
  const [loaded, setLoaded] = useState(0);
  const query = useQuery({
    queryKey: ["series", span],
    queryFn: ({ signal }) => loadSeries(span, signal, setLoaded),
    staleTime: 60_000,
    refetchOnWindowFocus: false,
  });
  return {
    readings: query.data ?? null,
    loaded,
    error: query.error,
    retry: () => void query.refetch(),
  };
}
