"use client";
import Link from "next/link";
import { useMemo } from "react";
import { Panel } from "@/lib/ui";
import type { ChartMark } from "@/lib/ui/line-chart-model";
import type { SeriesFrame, SeriesReading } from "../series-model";
import { SeriesChart } from "./series-chart";
import { type ChangeNames, seriesControl, seriesMarks } from "./series-chart-data";
import { SeriesState } from "./series-state";
import { useSeries } from "./use-series";

const BASELINE_MS = 60 * 86_400_000;

interface SeriesPreviewProps {
  frame: SeriesFrame;
  /** The page of the whole chart. */
  href: string;
  methods: readonly { readonly id: number; readonly code: string }[];
  instruments: readonly { readonly id: number; readonly code: string }[];
  incidents: readonly ChartMark[];
  zone: string;
}

/** A parameter's chart beside what it is about: the last weeks, and the way to the whole of it. */
export function SeriesPreview(props: SeriesPreviewProps) {
  const { frame, href } = props;
  const { pointId, parameter, fromAt, toAt } = frame;
  const series = useSeries({ pointId, parameterId: parameter.id, fromAt, toAt });
  return (
    <Panel
      id="chart"
      title={frame.isDefaultPoint ? parameter.name : `${parameter.name}, ${frame.pointName.toLowerCase()}`}
      aside={`last ${Math.round((toAt - fromAt) / 86_400_000)} days`}
      actions={
        <Link className="link inline-flex min-h-6 items-center" href={href}>
          Open the chart
        </Link>
      }
      className="scroll-mt-4 desk:scroll-mt-[100vh]"
    >
      <SeriesState series={series}>{(readings) => <Preview {...props} readings={readings} />}</SeriesState>
    </Panel>
  );
}

function Preview(props: SeriesPreviewProps & { readings: readonly SeriesReading[] }) {
  const { frame, href, readings, methods, instruments, incidents, zone } = props;
  const names = useMemo<ChangeNames>(
    () => ({
      methods: new Map(methods.map((each) => [each.id, each.code])),
      instruments: new Map(instruments.map((each) => [each.id, each.code])),
    }),
    [methods, instruments],
  );
  const first = readings[0]?.at ?? frame.fromAt;
  const control = useMemo(() => seriesControl(readings, first, first + BASELINE_MS), [readings, first]);
  const { marks } = useMemo(
    () => seriesMarks(readings, frame.course, names, incidents),
    [readings, frame.course, names, incidents],
  );
  if (!readings.some((each) => each.value !== null)) {
    return (
      <p className="text-ink-2">
        Nothing to draw in this period. <Link href={`${href}?period=all`}>Look at all of it</Link>.
      </p>
    );
  }
  return (
    <>
      <SeriesChart {...{ frame, readings, control, marks, zone }} height={300} tableHref={`${href}#table`} />
      {control.beyond.length > 0 && (
        <p className="pt-2 text-[0.9375rem]">
          <b className="font-semibold">
            {control.beyond.length === 1 ? "1 reading" : `${control.beyond.length} readings`} beyond the
            control limits
          </b>{" "}
          <span className="text-ink-2">
            of the first 60 days shown. <Link href={`${href}#control`}>What they are</Link>
          </span>
        </p>
      )}
    </>
  );
}
