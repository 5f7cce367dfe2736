import type { LimitShape } from "../model";
import { shapeLines } from "./limit-words";

export interface LimitShapeTextProps {
  shape: LimitShape;
  suspendedReason: string | null;
  decimals: number;
  zone: string;
}

/** Limits in words: one line, or a line for each knot of a ramp or a season. */
export function LimitShapeText({ shape, suspendedReason, decimals, zone }: LimitShapeTextProps) {
  if (suspendedReason !== null) {
    return (
      <>
        <b className="font-semibold">no limits</b>: {suspendedReason}
      </>
    );
  }
  const lines = shapeLines(shape, decimals, zone);
  if (shape.kind === "constant") return <>{lines[0]?.words}</>;
  return (
    <>
      <span className="text-sm text-ink-3">
        {shape.kind === "ramp" ? "in a straight line between" : "every year, in a straight line between"}
      </span>
      <ul>
        {lines.map((line) => (
          <li key={line.when}>
            <b className="font-semibold whitespace-nowrap">{line.when}</b>: {line.words}
          </li>
        ))}
      </ul>
    </>
  );
}
