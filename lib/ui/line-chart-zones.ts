import type { CustomSeriesRenderItem } from "echarts";
import { type BandSegment, type ChartData, type ChartWords, spread, timeRange } from "./line-chart-model";
import type { ChartPalette } from "./line-chart-palette";
import { numberText } from "./number-text";

type RenderApi = Parameters<CustomSeriesRenderItem>[1];
type Line = { from: [number, number]; to: [number, number] };

const custom = (id: string, z: number, renderItem: CustomSeriesRenderItem, clip = true) => ({
  id,
  type: "custom",
  z,
  clip,
  silent: true,
  tooltip: { show: false },
  data: [[0, 0]],
  encode: { x: -1, y: -1 },
  renderItem,
});

const stroke = (api: RenderApi, { from, to }: Line, style: object) => {
  const [x1 = 0, y1 = 0] = api.coord(from);
  const [x2 = 0, y2 = 0] = api.coord(to);
  return { type: "line" as const, shape: { x1, y1, x2, y2 }, style };
};

type Corner = (at: number, y: number | null | undefined, edge: number) => number[];

/** The area between two edges of a segment; an edge without a limit lies at the rim of the drawing. */
function zone(corner: Corner, s: BandSegment, above: ZoneEdge, below: ZoneEdge, fill: string) {
  const points = [
    corner(s.from, above.start, above.rim),
    corner(s.to, above.end, above.rim),
    corner(s.to, below.end, below.rim),
    corner(s.from, below.start, below.rim),
  ];
  return { type: "polygon" as const, shape: { points }, style: { fill, opacity: 0.85 } };
}

interface ZoneEdge {
  start: number | null | undefined;
  end: number | null | undefined;
  rim: number;
}

/** The tolerance: its area, the watch limits as darker shoulders inside it, and hard lines where a side has a limit. */
export function bandSeries({ band = [] }: ChartData, colours: ChartPalette): object {
  return custom("band", 1, (params, api) => {
    const area = params.coordSys as unknown as { y: number; height: number };
    const line = { stroke: colours["ink-2"], lineWidth: 1.3, fill: "none" };
    const corner: Corner = (at, y, edge) => {
      const [px = 0, py = 0] = api.coord([at, y ?? 0]);
      return [px, y === null || y === undefined ? edge : py];
    };
    const children = band.flatMap((s) => {
      const rims = { top: area.y, bottom: area.y + area.height };
      const high = { start: s.high, end: s.highAtEnd ?? s.high, rim: rims.top };
      const low = { start: s.low, end: s.lowAtEnd ?? s.low, rim: rims.bottom };
      const watchHigh = { start: s.watchHigh, end: s.watchHighAtEnd ?? s.watchHigh, rim: rims.top };
      const watchLow = { start: s.watchLow, end: s.watchLowAtEnd ?? s.watchLow, rim: rims.bottom };
      const hard = [low, high].flatMap(({ start, end }) =>
        start != null && end != null ? [stroke(api, { from: [s.from, start], to: [s.to, end] }, line)] : [],
      );
      return [
        ...(s.low != null || s.high != null ? [zone(corner, s, high, low, colours.band)] : []),
        ...(s.watchHigh != null ? [zone(corner, s, high, watchHigh, colours.shoulder)] : []),
        ...(s.watchLow != null ? [zone(corner, s, watchLow, low, colours.shoulder)] : []),
        ...hard,
      ];
    });
    return { type: "group", $mergeChildren: false, children } as ReturnType<CustomSeriesRenderItem>;
  });
}

/** The statistical lines, dashed in the colour of water. */
export function controlSeries({ control = [] }: ChartData, colours: ChartPalette): object {
  return custom("control", 3, (_params, api) => {
    const children = control.flatMap((s) =>
      (
        [
          ["centre", s.centre],
          ["lower", s.lower],
          ["upper", s.upper],
        ] as const
      ).flatMap(([what, y]) =>
        y === null || y === undefined
          ? []
          : [
              stroke(
                api,
                { from: [s.from, y], to: [s.to, y] },
                {
                  stroke: colours.water,
                  lineWidth: 1.3,
                  lineDash: what === "centre" ? [10, 3, 2, 3] : [7, 4],
                },
              ),
            ],
      ),
    );
    return { type: "group", $mergeChildren: false, children } as ReturnType<CustomSeriesRenderItem>;
  });
}

/** What happened: vertical lines with their words above the chart, in two rows; a word without room is left out. */
export function markSeries({ marks = [] }: ChartData, colours: ChartPalette): object {
  return custom(
    "marks",
    2,
    (params, api) => {
      const area = params.coordSys as unknown as { x: number; y: number; width: number; height: number };
      const freeFrom = [Number.NEGATIVE_INFINITY, Number.NEGATIVE_INFINITY];
      const children = marks.flatMap((mark) => {
        const [x = 0] = api.coord([mark.at, 0]);
        if (x < area.x || x > area.x + area.width) return [];
        const wide = mark.label.length * 6.5 + 10;
        const leftward = x + wide > area.x + area.width;
        const row = freeFrom.findIndex((free) => (leftward ? x - wide : x) > free);
        const top = area.y - 16 - Math.max(0, row) * 15;
        if (row >= 0) freeFrom[row] = leftward ? x : x + wide;
        const rule = {
          type: "line" as const,
          shape: { x1: x, x2: x, y1: row < 0 ? area.y : top, y2: area.y + area.height },
          style: { stroke: colours["ink-3"], lineWidth: 1, lineDash: [2, 3] },
        };
        const label = {
          type: "text" as const,
          style: {
            text: mark.label,
            x: x + (leftward ? -5 : 5),
            y: top,
            textAlign: leftward ? ("right" as const) : ("left" as const),
            fill: colours["ink-2"],
            backgroundColor: colours.sheet,
            font: `12px ${colours.sans}`,
          },
        };
        return row < 0 ? [rule] : [rule, label];
      });
      // words lie on the rules of their neighbours, never under them
      children.sort((a, b) => Number(a.type === "text") - Number(b.type === "text"));
      return { type: "group", $mergeChildren: false, children } as ReturnType<CustomSeriesRenderItem>;
    },
    false,
  );
}

/** The names of the lines that reach the right edge, kept apart. */
export function labelSeries(data: ChartData, words: ChartWords, colours: ChartPalette): object {
  const [, end] = timeRange(data);
  const b = data.band?.findLast((segment) => segment.from <= end && segment.to >= end);
  const c = data.control?.findLast((segment) => segment.from <= end && segment.to >= end);
  const figure = (y: number) => numberText(y, words.decimals);
  const wanted = [
    { y: b?.highAtEnd ?? b?.high, text: "tolerance", colour: colours["ink-2"] },
    { y: b?.lowAtEnd ?? b?.low, text: "tolerance", colour: colours["ink-2"] },
    { y: c?.upper, text: "upper control", colour: colours.water },
    { y: c?.centre, text: "centre", colour: colours.water },
    { y: c?.lower, text: "lower control", colour: colours.water },
  ].flatMap(({ y, text, colour }) =>
    y === null || y === undefined ? [] : [{ y, text: `${text} ${figure(y)}`, colour }],
  );
  return custom(
    "labels",
    6,
    (params, api) => {
      const area = params.coordSys as unknown as { x: number; width: number };
      const ys = spread(
        wanted.map(({ y }) => api.coord([0, y])[1] ?? 0),
        14,
      );
      const children = wanted.map(({ text, colour }, index) => ({
        type: "text" as const,
        style: {
          text,
          x: area.x + area.width + 6,
          y: ys[index] ?? 0,
          textVerticalAlign: "middle" as const,
          fill: colour,
          font: `12px ${colours.sans}`,
        },
      }));
      return { type: "group", $mergeChildren: false, children } as ReturnType<CustomSeriesRenderItem>;
    },
    false,
  );
}
