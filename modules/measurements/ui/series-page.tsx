"use client";
import { useMemo, useRef, useState } from "react";
import { Button, Notice, Panel, useLiveMessage } from "@/lib/ui";
import type { LineChartHandle } from "@/lib/ui/line-chart";
import type { ChartMark } from "@/lib/ui/line-chart-model";
import { addDays, dayBounds, epochToLocal, isCalendarDay } from "@/lib/zone";
import type { SeriesFrame, SeriesReading } from "../series-model";
import { type BaselineDays, ControlPanel } from "./control-panel";
import { SeriesChart, SeriesKey } from "./series-chart";
import { type ChangeNames, type SeriesControl, seriesControl, seriesMarks } from "./series-chart-data";
import { SeriesState } from "./series-state";
import { SeriesTable } from "./series-table";
import { seriesHref, useSeries } from "./use-series";

type Named = readonly { readonly id: number; readonly name: string }[];

export interface SeriesPageProps {
  frame: SeriesFrame;
  people: Named;
  methods: Named;
  instruments: Named;
  /** Incidents about this point and parameter, as marks. */
  incidents: readonly ChartMark[];
  /** The baseline that the address asks for. */
  baseline: Partial<BaselineDays>;
  zone: string;
}

const BASELINE_DAYS = 60;
const byId = (rows: Named): ReadonlyMap<number, string> => new Map(rows.map(({ id, name }) => [id, name]));

/** A parameter's chart at a point, its control limits, and the same numbers as a table. */
export function SeriesPage(props: SeriesPageProps) {
  const { pointId, fromAt, toAt, parameter } = props.frame;
  const series = useSeries({ pointId, parameterId: parameter.id, fromAt, toAt });
  return (
    <SeriesState series={series}>{(readings) => <SeriesBody {...props} readings={readings} />}</SeriesState>
  );
}

/** The first 60 days of what is shown, unless the address asks for others. */
function firstDays(
  asked: Partial<BaselineDays>,
  readings: readonly SeriesReading[],
  from: number,
  zone: string,
) {
  const fromOn = asked.fromOn ?? epochToLocal(readings[0]?.at ?? from, zone).on;
  return { fromOn, toOn: asked.toOn ?? addDays(fromOn, BASELINE_DAYS - 1) };
}

function controlOf(
  readings: readonly SeriesReading[],
  { fromOn, toOn }: BaselineDays,
  zone: string,
): SeriesControl {
  const none = (sentence: string): SeriesControl => ({
    baseline: { ok: false, sentence },
    beyond: [],
    segments: [],
  });
  if (!isCalendarDay(fromOn) || !isCalendarDay(toOn)) return none("Set both days of the baseline.");
  if (toOn < fromOn) return none("The baseline ends before it begins. Set its last day after its first.");
  return seriesControl(readings, dayBounds(fromOn, zone, 0).fromAt, dayBounds(toOn, zone, 0).toAt - 1);
}

/** The address keeps the baseline, so that a link shows what was seen. */
function keepInAddress({ fromOn, toOn }: BaselineDays): void {
  const address = new URL(window.location.href);
  address.searchParams.set("base-from", fromOn);
  address.searchParams.set("base-to", toOn);
  window.history.replaceState(null, "", address);
}

function SeriesBody(props: SeriesPageProps & { readings: readonly SeriesReading[] }) {
  const { frame, readings, zone, incidents } = props;
  const { parameter } = frame;
  const isNumber = parameter.kind === "number" || parameter.kind === "count";
  const people = useMemo(() => byId(props.people), [props.people]);
  const names = useMemo<ChangeNames>(
    () => ({ methods: byId(props.methods), instruments: byId(props.instruments) }),
    [props.methods, props.instruments],
  );
  const [days, setDays] = useState(() => firstDays(props.baseline, readings, frame.fromAt, zone));
  const control = useMemo(() => controlOf(readings, days, zone), [readings, days, zone]);
  const { marks, leftOut } = useMemo(
    () => seriesMarks(readings, frame.course, names, incidents),
    [readings, frame.course, names, incidents],
  );
  const choose = (chosen: BaselineDays) => {
    setDays(chosen);
    keepInAddress(chosen);
  };
  const table = { readings, parameter, control, people, names, zone };
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
      <ChartPanel {...{ frame, readings, control, marks, leftOut, zone, isNumber }} />
      {isNumber && readings.length > 0 && (
        <ControlPanel {...{ control, readings, parameter, days, zone }} onDays={choose} />
      )}
      <Panel title="The same as a table" id="table">
        <SeriesTable {...table} />
      </Panel>
    </div>
  );
}

interface ChartPanelProps {
  frame: SeriesFrame;
  readings: readonly SeriesReading[];
  control: SeriesControl;
  marks: readonly ChartMark[];
  leftOut: readonly string[];
  zone: string;
  isNumber: boolean;
}

function ChartPanel({ frame, readings, control, marks, leftOut, zone, isNumber }: ChartPanelProps) {
  const chart = useRef<LineChartHandle>(null);
  const say = useLiveMessage();
  const { parameter, pointId, fromAt, toAt } = frame;
  const name = `${frame.systemCode}-${frame.pointName}-${parameter.code}`.replaceAll(/[^\w.-]+/g, "-");
  const isDrawn = isNumber && readings.some((each) => each.value !== null);
  const png = () => {
    const data = chart.current?.toPng();
    if (!data)
      return say({ text: "The chart is not drawn yet. Wait a moment and try again.", kind: "trouble" });
    const link = document.createElement("a");
    link.href = data;
    link.download = `${name}.png`;
    link.click();
  };
  return (
    <Panel
      title="Chart"
      id="chart"
      actions={
        <>
          {isDrawn && (
            <Button size="small" onClick={png}>
              PNG
            </Button>
          )}
          <a
            className="btn"
            data-variant="plain"
            data-size="small"
            href={seriesHref({ pointId, parameterId: parameter.id, fromAt, toAt }, "csv")}
            download
          >
            CSV
          </a>
        </>
      }
    >
      {isDrawn ? (
        <>
          <SeriesChart
            ref={chart}
            {...{ frame, readings, control, marks, zone }}
            height={420}
            tableHref="#table"
          />
          <SeriesKey readings={readings} control={control} />
        </>
      ) : (
        <p className="text-ink-2">{nothingDrawn(readings.length, isNumber)}</p>
      )}
      {leftOut.length > 0 && (
        <p className="pt-2 text-sm text-ink-2">
          Too many to be marked: {leftOut.join(", ")}. They stand in the table; a shorter period marks them.
        </p>
      )}
      <Suspensions frame={frame} />
    </Panel>
  );
}

function nothingDrawn(count: number, isNumber: boolean): string {
  if (count === 0) return "No readings in this period, so there is nothing to draw. Choose a longer one.";
  if (!isNumber)
    return "These are answers in words, so there is no line to draw. They stand in the table below.";
  return "No reading of this period has a number, so there is no line to draw. They stand in the table below.";
}

function Suspensions({ frame }: { frame: SeriesFrame }) {
  const suspended = frame.course.filter((piece) => piece.state === "suspended");
  if (suspended.length === 0) return null;
  return (
    <div className="pt-3">
      <Notice title="Limits were suspended for a part of this period">
        Without band there: {suspended.map((piece) => piece.reason).join("; ")}.
      </Notice>
    </div>
  );
}
