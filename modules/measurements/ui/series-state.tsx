"use client";
import type { ReactNode } from "react";
import { Button, Notice, Skeleton } from "@/lib/ui";
import type { SeriesReading } from "../series-model";
import type { useSeries } from "./use-series";

/** A series that is coming, could not be fetched, or is there. */
export function SeriesState({
  series,
  children,
}: {
  series: ReturnType<typeof useSeries>;
  children: (readings: readonly SeriesReading[]) => ReactNode;
}) {
  const { readings, loaded, error, retry } = series;
  if (readings !== null) return children(readings);
  if (error) {
    return (
      <Notice
        kind="stop"
        title="The readings did not come"
        actions={
          <Button size="small" onClick={retry}>
            Ask again
          </Button>
        }
      >
        {error.message}
      </Notice>
    );
  }
  return (
    <div className="min-h-64">
      <Skeleton lines={6} label="The readings are on their way" />
      {loaded > 0 && (
        <p className="pt-3 text-sm text-ink-2">
          <span className="num">{loaded.toLocaleString("en-GB")}</span> readings so far
        </p>
      )}
    </div>
  );
}
