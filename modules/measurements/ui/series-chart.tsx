"use client";
import dynamic from "next/dynamic";
import { type Ref, useMemo } from "react";
import { Skeleton, StatusShape } from "@/lib/ui";
import type { LineChartHandle } from "@/lib/ui/line-chart";
import type { ChartMark } from "@/lib/ui/line-chart-model";
import { unitLabel } from "@/lib/units/factors";
import type { SeriesFrame, SeriesReading } from "../series-model";
import { chartBand, chartPoints, MOST_FLAGS, type SeriesControl } from "./series-chart-data";

const LineChart = dynamic(() => import("@/lib/ui/line-chart").then((module) => module.LineChart), {
  ssr: false,
  loading: () => <Skeleton lines={6} label="The chart is being drawn" />,
});

interface SeriesChartProps {
  frame: SeriesFrame;
  readings: readonly SeriesReading[];
  control: SeriesControl;
  marks: readonly ChartMark[];
  zone: string;
  height?: number;
  tableHref?: string;
  ref?: Ref<LineChartHandle>;
}

/** A series over its tolerance, with the control limits of a baseline and what happened along the way. */
export function SeriesChart(props: SeriesChartProps) {
  const { frame, readings, control, marks, zone, height = 360, tableHref, ref } = props;
  const { parameter } = frame;
  const points = useMemo(() => chartPoints(readings, control.beyond), [readings, control.beyond]);
  const band = useMemo(() => chartBand(frame.course), [frame.course]);
  return (
    <LineChart
      title={`${parameter.name}, ${frame.pointName}, ${frame.systemCode}`}
      unit={unitLabel(parameter.unit)}
      decimals={parameter.decimals}
      zone={zone}
      points={points}
      band={band}
      control={control.segments}
      marks={marks}
      height={height}
      {...(tableHref === undefined ? {} : { tableHref })}
      {...(ref === undefined ? {} : { ref })}
    />
  );
}

/** What the shapes of the chart say, in one line; only those that occur. */
export function SeriesKey({
  readings,
  control,
}: {
  readings: readonly SeriesReading[];
  control: SeriesControl;
}) {
  const has = (status: SeriesReading["status"]) => readings.some((each) => each.status === status);
  const isHollow = readings.some(
    (each) => each.isCorrected || (each.qualifier !== "" && each.value !== null),
  );
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-sm text-ink-2">
      {(["watch", "out", "implausible"] as const).filter(has).map((status) => (
        <li key={status} className="inline-flex items-center gap-1.5">
          <StatusShape status={status} direction={status === "out" ? "high" : null} />
          {
            { watch: "watch", out: "out of tolerance", implausible: "implausible, no line leads to it" }[
              status
            ]
          }
        </li>
      ))}
      {isHollow && (
        <li className="inline-flex items-center gap-1.5">
          <Shape d="M5 1A4 4 0 1 1 5 9A4 4 0 1 1 5 1Z" /> corrected, or known only as less or more than
        </li>
      )}
      {control.beyond.length > 0 && control.beyond.length <= MOST_FLAGS && (
        <li className="inline-flex items-center gap-1.5">
          <Shape d="M1 1H9V9H1Z" /> beyond a control limit
        </li>
      )}
    </ul>
  );
}

function Shape({ d }: { d: string }) {
  return (
    <svg width="0.8em" height="0.8em" viewBox="0 0 10 10" aria-hidden="true" className="flex-none">
      <path d={d} fill="none" className="stroke-ink" strokeWidth="1.6" />
    </svg>
  );
}
