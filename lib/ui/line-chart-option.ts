import type { EChartsCoreOption } from "echarts/core";
import {
  type ChartData,
  type ChartPoint,
  type ChartWords,
  pointText,
  timeRange,
  valueRange,
} from "./line-chart-model";
import type { ChartPalette } from "./line-chart-palette";
import { bandSeries, controlSeries, labelSeries, markSeries } from "./line-chart-zones";
import { numberText } from "./number-text";
import { timeText } from "./time-words";

const DAY_MS = 86_400_000;

/** Builds what ECharts draws; `shown` are the thinned points of the present window. */
export function chartOption(
  data: ChartData,
  shown: readonly ChartPoint[],
  words: ChartWords,
  colours: ChartPalette,
  width: number,
): EChartsCoreOption {
  const narrow = width < 520;
  const [low, high] = valueRange(data);
  return {
    animation: false,
    textStyle: { fontFamily: colours.sans },
    grid: {
      left: 8,
      right: narrow ? 12 : 112,
      top: (data.marks?.length ?? 0) > 0 ? 42 : 14,
      bottom: 46,
      outerBoundsMode: "same",
      outerBoundsContain: "axisLabel",
    },
    xAxis: timeAxis(data, words, colours),
    yAxis: valueAxis(low, high, words, colours),
    tooltip: tooltip(words, colours),
    dataZoom: zooms(colours),
    series: [
      bandSeries(data, colours),
      controlSeries(data, colours),
      markSeries(data, colours),
      pointSeries(shown, colours),
      implausibleSeries(shown, colours, low, high),
      flagSeries(shown, colours),
      ...(narrow ? [] : [labelSeries(data, words, colours)]),
    ],
  };
}

const axisText = (colours: ChartPalette) => ({
  fontFamily: colours.mono,
  fontSize: 12,
  color: colours["ink-3"],
});

/** Days under a long stretch, with their year under a longer one, times under a short one; in the facility's zone. */
function timeAxis(data: ChartData, words: ChartWords, colours: ChartPalette): object {
  const [from, to] = timeRange(data);
  const formatter = (at: number) => {
    const [day = "", time = ""] = timeText(at, words.zone, "day-time").split(", ");
    if (to - from > 400 * DAY_MS) return day;
    const short = day.replace(/ \d{4}$/, "");
    return to - from > 3 * DAY_MS ? short : `${time}\n${short}`;
  };
  return {
    type: "time",
    min: from,
    max: to,
    axisLabel: { ...axisText(colours), hideOverlap: true, formatter },
    axisLine: { lineStyle: { color: colours.edge } },
    axisTick: { lineStyle: { color: colours.edge } },
    splitLine: { show: false },
  };
}

function valueAxis(min: number, max: number, words: ChartWords, colours: ChartPalette): object {
  return {
    type: "value",
    min,
    max,
    axisLabel: {
      ...axisText(colours),
      showMinLabel: false,
      showMaxLabel: false,
      formatter: (y: number) => numberText(y, words.decimals),
    },
    splitLine: { lineStyle: { color: colours.rule, width: 1 } },
  };
}

function tooltip(words: ChartWords, colours: ChartPalette): object {
  return {
    trigger: "axis",
    // drawn on the canvas: no markup, so nothing typed by a person can become any
    renderMode: "richText",
    confine: true,
    backgroundColor: colours.field,
    borderColor: colours.edge,
    borderWidth: 1,
    shadowBlur: 0,
    shadowColor: "transparent",
    textStyle: { color: colours.ink, fontFamily: colours.sans, fontSize: 14 },
    axisPointer: { type: "line", lineStyle: { color: colours["ink-3"], type: "solid" } },
    formatter: (items: { data?: { point?: ChartPoint } }[]) => {
      const point = items.map((item) => item.data?.point).find((p) => p !== undefined);
      return point === undefined ? "" : pointText(point, words).replace(/: /, "\n");
    },
  };
}

function zooms(colours: ChartPalette): object[] {
  return [
    {
      type: "inside",
      filterMode: "none",
      zoomOnMouseWheel: "ctrl",
      moveOnMouseMove: true,
      moveOnMouseWheel: false,
    },
    {
      type: "slider",
      filterMode: "none",
      height: 24,
      bottom: 4,
      showDetail: false,
      brushSelect: false,
      showDataShadow: false,
      borderColor: colours.edge,
      backgroundColor: "transparent",
      fillerColor: `${colours.water}26`,
      handleSize: "100%",
      handleStyle: { color: colours.field, borderColor: colours.water, borderWidth: 1.5 },
      moveHandleSize: 0,
      borderRadius: 3,
    },
  ];
}

function symbolOf(point: ChartPoint, dense: boolean, colours: ChartPalette): object {
  switch (point.status) {
    case "watch":
      return {
        symbol: "diamond",
        symbolSize: 10,
        itemStyle: { color: colours["watch-mark"], borderColor: colours.field, borderWidth: 1 },
      };
    case "out":
      return {
        symbol: "triangle",
        symbolSize: 11,
        symbolRotate: point.direction === "low" ? 180 : 0,
        itemStyle: { color: colours["out-mark"], borderColor: colours.field, borderWidth: 1 },
      };
    default:
      if (point.kind === undefined) return { symbol: "circle", symbolSize: dense ? 0 : 4 };
      return {
        symbol: "circle",
        symbolSize: 8,
        itemStyle: { color: colours.field, borderColor: colours.ink, borderWidth: 1.5 },
      };
  }
}

function pointSeries(shown: readonly ChartPoint[], colours: ChartPalette): object {
  const plausible = shown.filter((point) => point.status !== "implausible");
  const dense = plausible.length > 400;
  return {
    id: "points",
    type: "line",
    z: 4,
    showSymbol: true,
    lineStyle: { color: colours.ink, width: 1.2 },
    itemStyle: { color: colours.ink },
    emphasis: { scale: 1.5 },
    data: plausible.map((point) => ({
      value: [point.at, point.value],
      point,
      ...symbolOf(point, dense, colours),
    })),
  };
}

/** What cannot be true is shown, but no line leads to it; beyond the height it stands at the edge as an arrowhead. */
function implausibleSeries(
  shown: readonly ChartPoint[],
  colours: ChartPalette,
  low: number,
  high: number,
): object {
  return {
    id: "implausible",
    type: "scatter",
    z: 5,
    data: shown
      .filter((point) => point.status === "implausible")
      .map((point) => {
        const beyond = point.value > high || point.value < low;
        return {
          value: [point.at, Math.min(high, Math.max(low, point.value))],
          point,
          symbol: beyond ? "triangle" : "circle",
          symbolSize: beyond ? 12 : 9,
          symbolRotate: point.value < low ? 180 : 0,
          itemStyle: {
            color: beyond ? colours["odd-mark"] : colours.field,
            borderColor: colours["odd-mark"],
            borderWidth: beyond ? 0 : 2,
            borderType: "dashed",
          },
        };
      }),
  };
}

function flagSeries(shown: readonly ChartPoint[], colours: ChartPalette): object {
  return {
    id: "flags",
    type: "scatter",
    z: 5,
    silent: true,
    tooltip: { show: false },
    symbol: "rect",
    symbolSize: 13,
    itemStyle: { color: "transparent", borderColor: colours.ink, borderWidth: 1.6 },
    data: shown.filter((p) => p.flag !== undefined).map((p) => ({ value: [p.at, p.value] })),
  };
}
