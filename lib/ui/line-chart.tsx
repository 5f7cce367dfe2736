"use client";
import { CustomChart, LineChart as EChartsLine, ScatterChart } from "echarts/charts";
import {
  DataZoomInsideComponent,
  DataZoomSliderComponent,
  GridComponent,
  TooltipComponent,
} from "echarts/components";
import { type EChartsType, init, use as registerECharts } from "echarts/core";
import { CanvasRenderer } from "echarts/renderers";
import Link from "next/link";
import {
  type KeyboardEvent,
  type Ref,
  useCallback,
  useEffect,
  useId,
  useImperativeHandle,
  useMemo,
  useRef,
  useState,
} from "react";
import { type ChartData, type ChartWords, chartText, pointText } from "./line-chart-model";
import { chartOption } from "./line-chart-option";
import { CHART_TOKENS, type ChartPalette } from "./line-chart-palette";
import { nextStep, panBy, showPoint, visiblePoints, zoomBy } from "./line-chart-window";

registerECharts([
  EChartsLine,
  ScatterChart,
  CustomChart,
  GridComponent,
  TooltipComponent,
  DataZoomInsideComponent,
  DataZoomSliderComponent,
  CanvasRenderer,
]);

export interface LineChartHandle {
  /** The chart as it stands, a PNG data URL at twice the screen's resolution. */
  toPng: () => string | null;
}

export interface LineChartProps extends ChartData {
  title: string;
  unit?: string;
  decimals: number;
  /** The facility's zone (IANA). */
  zone: string;
  /** Where the same numbers stand as a table. */
  tableHref?: string;
  height?: number;
  ref?: Ref<LineChartHandle>;
}

/** A time series over its tolerance, with statistical lines and marks. Keys: arrows step, + and − zoom, 0 shows all. */
export function LineChart(props: LineChartProps) {
  const {
    title,
    unit = "",
    decimals,
    zone,
    points,
    band,
    control,
    marks,
    tableHref,
    height = 320,
    ref,
  } = props;
  const words = useMemo<ChartWords>(() => ({ title, unit, decimals, zone }), [title, unit, decimals, zone]);
  const data = useMemo<ChartData>(() => ({ points, band, control, marks }), [points, band, control, marks]);
  const label = useMemo(() => chartText(data, words), [data, words]);
  const place = useRef<HTMLDivElement>(null);
  const chart = useChart(place, data, words);
  const [spoken, setSpoken] = useState("");
  const step = useRef(-1);
  const helpId = useId();
  useImperativeHandle(ref, () => ({ toPng: () => toPng(chart.current) }), [chart]);

  const zoom = (factor: number) => zoomBy(chart.current, factor);
  const onKeyDown = (event: KeyboardEvent) => {
    const way = { ArrowLeft: -1, ArrowRight: 1 }[event.key];
    if (way !== undefined && event.shiftKey) panBy(chart.current, way * 0.2);
    else if (way !== undefined) {
      step.current = nextStep(points, step.current, way);
      const point = points[step.current];
      if (point !== undefined) setSpoken(pointText(point, words));
      showPoint(chart.current, data, point?.at);
    } else if (event.key === "+" || event.key === "=") zoom(0.5);
    else if (event.key === "-" || event.key === "−") zoom(2);
    else if (event.key === "0" || event.key === "Home") zoom(Number.POSITIVE_INFINITY);
    else return;
    event.preventDefault();
  };

  return (
    <figure>
      <div
        ref={place}
        role="application"
        aria-roledescription="chart"
        aria-label={label}
        aria-describedby={helpId}
        tabIndex={0}
        onKeyDown={onKeyDown}
        style={{ height }}
        className="w-full min-w-0"
      />
      <p id={helpId} className="sr-only">
        Left and right arrow read the points, plus and minus zoom, 0 shows all.
      </p>
      <p aria-live="polite" className="sr-only">
        {spoken}
      </p>
      <LineKey band={(band?.length ?? 0) > 0} control={(control?.length ?? 0) > 0} />
      <figcaption className="mt-1 -ml-[0.7rem] flex flex-wrap items-center gap-x-1 gap-y-1">
        <button
          type="button"
          className="btn"
          data-variant="quiet"
          data-size="small"
          onClick={() => zoom(0.5)}
        >
          Closer
        </button>
        <button type="button" className="btn" data-variant="quiet" data-size="small" onClick={() => zoom(2)}>
          Wider
        </button>
        <button
          type="button"
          className="btn"
          data-variant="quiet"
          data-size="small"
          onClick={() => zoom(Number.POSITIVE_INFINITY)}
        >
          All
        </button>
        {tableHref !== undefined && (
          <Link href={tableHref} className="link ml-auto inline-flex min-h-9 items-center px-1">
            The same as a table
          </Link>
        )}
      </figcaption>
    </figure>
  );
}

/** On narrow screens the lines have no names beside them; this says which is which. */
function LineKey({ band, control }: { band: boolean; control: boolean }) {
  if (!band && !control) return null;
  return (
    <p className="flex flex-wrap gap-x-5 text-sm text-ink-2 sm:hidden" aria-hidden="true">
      {band && (
        <span className="inline-flex items-center gap-2">
          <svg width="26" height="10">
            <path d="M0 1H26V9H0Z" className="fill-band" />
            <path d="M0 1H26M0 9H26" className="stroke-ink-2" strokeWidth="1.3" />
          </svg>
          tolerance
        </span>
      )}
      {control && (
        <span className="inline-flex items-center gap-2">
          <svg width="26" height="4">
            <path d="M0 2H26" className="stroke-water" strokeWidth="1.5" strokeDasharray="7 4" />
          </svg>
          control lines
        </span>
      )}
    </p>
  );
}

/** Keeps one ECharts drawing alive in a place, in step with data, size, zoom and theme. */
function useChart(place: React.RefObject<HTMLDivElement | null>, data: ChartData, words: ChartWords) {
  const chart = useRef<EChartsType | null>(null);
  const latest = useRef({ data, words });
  const draw = useCallback(() => {
    const current = chart.current;
    if (current === null) return;
    const { data: d, words: w } = latest.current;
    current.setOption(chartOption(d, visiblePoints(current, d), w, palette(), current.getWidth()), {
      replaceMerge: ["series"],
    });
  }, []);

  useEffect(() => {
    const element = place.current;
    if (element === null) return;
    chart.current = init(element, null, { renderer: "canvas" });
    draw();
    let frame = 0;
    const soon = () => {
      cancelAnimationFrame(frame);
      frame = requestAnimationFrame(draw);
    };
    chart.current.on("datazoom", soon);
    const resize = new ResizeObserver(() => {
      chart.current?.resize();
      soon();
    });
    resize.observe(element);
    const theme = new MutationObserver(soon);
    theme.observe(document.documentElement, { attributes: true, attributeFilter: ["data-theme"] });
    void document.fonts?.ready.then(soon);
    return () => {
      cancelAnimationFrame(frame);
      resize.disconnect();
      theme.disconnect();
      chart.current?.dispose();
      chart.current = null;
    };
  }, [place, draw]);

  useEffect(() => {
    latest.current = { data, words };
    draw();
  }, [draw, data, words]);
  return chart;
}

function toPng(chart: EChartsType | null): string | null {
  return (
    chart?.getDataURL({
      type: "png",
      pixelRatio: 2,
      backgroundColor: palette().sheet,
      excludeComponents: ["dataZoom"],
    }) ?? null
  );
}

/** The tokens of the theme that is on the page now. */
function palette(): ChartPalette {
  const style = getComputedStyle(document.documentElement);
  const read = (name: string) => style.getPropertyValue(`--${name}`).trim();
  const colours = Object.fromEntries(CHART_TOKENS.map((name) => [name, read(name) || "#000000"]));
  return {
    ...(colours as Record<(typeof CHART_TOKENS)[number], string>),
    sans: '"Atkinson Hyperlegible Next Variable", "Signs", system-ui, sans-serif',
    mono: '"Atkinson Hyperlegible Mono Variable", "Signs Mono", ui-monospace, monospace',
  };
}
