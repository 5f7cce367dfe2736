import { numberText } from "./number-text";
import type { StatusCode } from "./status-word";
import { type WellStripInput, type WellStripScale, wellStripScale } from "./well-strip-scale";
import { wellStripText } from "./well-strip-text";

export interface WellStripProps extends WellStripInput {
  /** What is measured; with unit and status it goes into the text equivalent. */
  name?: string;
  unit?: string;
  status?: StatusCode;
  /** `cell` stands in a table or an entry line, `large` on a page of its own subject, with figures under it. */
  size?: "cell" | "large";
  /** Fills the width it is given instead of 150 px (cell). */
  fluid?: boolean;
  className?: string;
}

/** Heights in px of the two sizes: margin above the tube, the tube, the whole drawing. */
const SHAPE = {
  cell: { top: 3, tube: 15, height: 25, notch: 5, tick: 2, tickMajor: 3.5 },
  large: { top: 4, tube: 26, height: 60, notch: 8, tick: 3.5, tickMajor: 6 },
} as const;
type Shape = (typeof SHAPE)[keyof typeof SHAPE];

/** The caps take 5 % at each end: shares of the scale are drawn between them. */
function at(share: number): string {
  return `${(5 + 90 * share).toFixed(3)}%`;
}

/** A thin graduated tube: tolerance band between hard lines, watch shoulders, target notch, last value, the reading. */
export function WellStrip(props: WellStripProps) {
  const { size = "cell", fluid = size === "large", status, className = "" } = props;
  const scale = wellStripScale(props);
  const shape = SHAPE[size];
  return (
    <svg
      className={`well-strip ${className}`}
      data-status={status ?? "none"}
      data-size={size}
      width={fluid ? "100%" : 150}
      height={shape.height}
      role="img"
      aria-label={wellStripText(props)}
    >
      <rect x="1" y={shape.top} width="100%" height={shape.tube} rx={shape.tube / 2} className="ws-tube" />
      {scale !== null && <Zones scale={scale} shape={shape} />}
      {scale !== null && <Marks scale={scale} shape={shape} />}
      {scale !== null && size === "large" && <Figures scale={scale} shape={shape} strip={props} />}
      {scale !== null && <Reading scale={scale} shape={shape} implausible={status === "implausible"} />}
    </svg>
  );
}

interface PartProps {
  scale: WellStripScale;
  shape: Shape;
}

function Zones({ scale, shape }: PartProps) {
  const { band, shoulders } = scale;
  const y = shape.top + 0.8;
  const height = shape.tube - 1.6;
  if (band === null) return null;
  const wide = (span: { from: number; to: number }) => `${(90 * (span.to - span.from)).toFixed(3)}%`;
  const open = band.hardFrom ? (band.hardTo ? undefined : "high") : band.hardTo ? "low" : "both";
  const left = band.hardFrom ? 5 + 90 * band.from : 0;
  const right = band.hardTo ? 5 + 90 * band.to : 100;
  return (
    <>
      <rect
        x={`${left.toFixed(3)}%`}
        y={y}
        width={`${(right - left).toFixed(3)}%`}
        height={height}
        className="ws-band"
        data-open={open}
      />
      {shoulders.map((span) => (
        <rect
          key={span.from}
          x={at(span.from)}
          y={y}
          width={wide(span)}
          height={height}
          className="ws-shoulder"
        />
      ))}
      {band.hardFrom && <HardLine share={band.from} shape={shape} />}
      {band.hardTo && <HardLine share={band.to} shape={shape} />}
    </>
  );
}

function HardLine({ share, shape }: { share: number; shape: Shape }) {
  const x = at(share);
  return <line x1={x} x2={x} y1={shape.top - 2} y2={shape.top + shape.tube + 2} className="ws-limit" />;
}

function Marks({ scale, shape }: PartProps) {
  const bottom = shape.top + shape.tube;
  return (
    <>
      {scale.ticks.map((tick) => (
        <line
          key={tick.value}
          x1={at(tick.at)}
          x2={at(tick.at)}
          y1={bottom + 1.5}
          y2={bottom + 1.5 + (tick.major ? shape.tickMajor : shape.tick)}
          className="ws-tick"
        />
      ))}
      {scale.target !== null && (
        <svg x={at(scale.target)} y={bottom - shape.notch * 0.55} overflow="visible" aria-hidden="true">
          <path
            d={`M0 0L${shape.notch * 0.62} ${shape.notch}H${-shape.notch * 0.62}Z`}
            className="ws-notch"
          />
        </svg>
      )}
      {scale.previous !== null && (
        <line
          x1={at(scale.previous)}
          x2={at(scale.previous)}
          y1={shape.top + 2}
          y2={bottom - 2}
          className="ws-previous"
        />
      )}
    </>
  );
}

/** The meniscus: a line across the tube that climbs a little at both walls; an arrowhead when it is beyond the scale. */
function Reading({ scale, shape, implausible }: PartProps & { implausible: boolean }) {
  if (scale.value === null) return null;
  const h = shape.tube;
  if (scale.beyond !== null) {
    const side = scale.beyond === "high" ? 1 : -1;
    const r = h * 0.32;
    return (
      <svg
        x={scale.beyond === "high" ? "100%" : "0%"}
        y={shape.top + h / 2}
        overflow="visible"
        aria-hidden="true"
      >
        <g transform={`translate(${-side * h * 0.42} 0) scale(${side} 1)`}>
          <path d={`M${-r * 1.7} ${-h / 2 + 2}V${h / 2 - 2}`} className="ws-meniscus" />
          <path d={`M${-r * 0.8} ${-r}L${r} 0L${-r * 0.8} ${r}Z`} className="ws-beyond" />
        </g>
      </svg>
    );
  }
  const c = h * 0.22;
  const path = `M${-c} 0Q0 ${c * 0.2} 0 ${c}V${h - c}Q0 ${h - c * 0.2} ${-c} ${h}`;
  return (
    <svg x={at(scale.value)} y={shape.top} overflow="visible" aria-hidden="true">
      <path d={path} className="ws-halo" />
      <path d={path} className="ws-meniscus" strokeDasharray={implausible ? "3 2" : undefined} />
    </svg>
  );
}

/** Under a large strip: the limits and the target as figures; the target gives way when it would touch a limit. */
function Figures({ scale, shape, strip }: PartProps & { strip: WellStripProps }) {
  const y = shape.top + shape.tube + 22;
  const decimals = strip.decimals ?? 1;
  const figures: { share: number; value: number; what: string }[] = [];
  const { toleranceLow: low, toleranceHigh: high, target } = strip;
  if (scale.band?.hardFrom && low != null) figures.push({ share: scale.band.from, value: low, what: "low" });
  if (scale.band?.hardTo && high != null) figures.push({ share: scale.band.to, value: high, what: "high" });
  const crowded = figures.some(
    (figure) => scale.target !== null && Math.abs(figure.share - scale.target) < 0.14,
  );
  if (scale.target !== null && target != null && !crowded) {
    figures.push({ share: scale.target, value: target, what: "target" });
  }
  return (
    <>
      {figures.map((figure) => (
        <text
          key={figure.what}
          x={at(figure.share)}
          y={y}
          textAnchor="middle"
          className="ws-figure"
          aria-hidden="true"
        >
          {numberText(figure.value, decimals)}
        </text>
      ))}
    </>
  );
}
