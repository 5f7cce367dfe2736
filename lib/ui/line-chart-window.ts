import type { EChartsType } from "echarts/core";
import { keepExtremes } from "./downsample";
import { type ChartData, isTelling, timeRange } from "./line-chart-model";

interface ZoomState {
  start: number;
  end: number;
}

function zoomState(chart: EChartsType): ZoomState {
  const option = chart.getOption() as { dataZoom?: Partial<ZoomState>[] } | undefined;
  const found = option?.dataZoom?.[0];
  return { start: found?.start ?? 0, end: found?.end ?? 100 };
}

/** The points of the present window and one beyond each side, thinned to the width. */
export function visiblePoints(chart: EChartsType, data: ChartData) {
  const [from, to] = timeRange(data);
  const { start, end } = zoomState(chart);
  const left = from + ((to - from) * start) / 100;
  const right = from + ((to - from) * end) / 100;
  const { points } = data;
  let first = points.findIndex((p) => p.at >= left);
  if (first < 0) first = points.length;
  let last = points.findLastIndex((p) => p.at <= right);
  first = Math.max(0, first - 1);
  last = Math.min(points.length - 1, last + 1);
  const buckets = Math.max(50, Math.floor(chart.getWidth() / 3));
  return keepExtremes(points.slice(first, last + 1), { buckets, mustKeep: isTelling });
}

/** Halves or doubles the window around its middle; Infinity shows all. */
export function zoomBy(chart: EChartsType | null, factor: number): void {
  if (chart === null) return;
  const { start, end } = zoomState(chart);
  const half = Math.min(50, Math.max(0.25, ((end - start) / 2) * factor));
  const middle = Math.min(100 - half, Math.max(half, (start + end) / 2));
  chart.dispatchAction({ type: "dataZoom", start: middle - half, end: middle + half });
}

/** Moves the window by a share of its width. */
export function panBy(chart: EChartsType | null, share: number): void {
  if (chart === null) return;
  const { start, end } = zoomState(chart);
  const move = Math.min(100 - end, Math.max(-start, (end - start) * share));
  chart.dispatchAction({ type: "dataZoom", start: start + move, end: end + move });
}

/** Arrow keys begin at the newest point and stop at both ends. */
export function nextStep(points: readonly unknown[], now: number, way: number): number {
  if (now < 0 || now >= points.length) return points.length - 1;
  return Math.min(points.length - 1, Math.max(0, now + way));
}

/** Points at a moment; brings it into the window first when it lies outside. */
export function showPoint(chart: EChartsType | null, data: ChartData, at: number | undefined): void {
  if (chart === null || at === undefined) return;
  const [from, to] = timeRange(data);
  const share = (100 * (at - from)) / (to - from);
  const { start, end } = zoomState(chart);
  if (share < start || share > end) {
    const half = (end - start) / 2;
    const middle = Math.min(100 - half, Math.max(half, share));
    chart.dispatchAction({ type: "dataZoom", start: middle - half, end: middle + half });
  }
  const [x] = chart.convertToPixel({ gridIndex: 0 }, [at, 0]);
  chart.dispatchAction({ type: "showTip", x, y: chart.getHeight() / 3 });
}
