/**
 * Where does everything stand on a well strip? Pure: numbers in, shares of the tube (0 left end, 1 right end) out.
 *
 * Rules of the scale, in this order:
 * 1. Two hard limits: the band fills the middle 40 % of the tube, so that strips under each other can be compared.
 * 2. One hard limit: it stands at 65 % (upper) or 35 % (lower) of the tube; the open side reaches to the possible
 *    bound or to the target and watch limit, whichever is known.
 * 3. No limits: the tube is centred on what is known of the value and the previous one.
 * 4. The tube never shows what cannot be (below `possibleLow`, above `possibleHigh`).
 */
export interface WellStripInput {
  value?: number | null | undefined;
  previous?: number | null | undefined;
  target?: number | null | undefined;
  toleranceLow?: number | null | undefined;
  toleranceHigh?: number | null | undefined;
  watchLow?: number | null | undefined;
  watchHigh?: number | null | undefined;
  /** Bounds outside which a value is not physically possible (0 for a concentration). */
  possibleLow?: number | null | undefined;
  possibleHigh?: number | null | undefined;
  /** Decimals shown; also the smallest width that makes sense (default 1). */
  decimals?: number | undefined;
}

export interface StripSpan {
  from: number;
  to: number;
}

export interface WellStripScale {
  min: number;
  max: number;
  /** The tolerance band; a side without a hard limit runs to the end of the tube. Null when there are no limits. */
  band: (StripSpan & { hardFrom: boolean; hardTo: boolean }) | null;
  shoulders: StripSpan[];
  target: number | null;
  previous: number | null;
  value: number | null;
  /** The value lies beyond the end of the tube: an arrowhead stands in the cap. */
  beyond: "low" | "high" | null;
  ticks: { at: number; value: number; major: boolean }[];
}

interface Known {
  low: number | null;
  high: number | null;
  watchLow: number | null;
  watchHigh: number | null;
  target: number | null;
  value: number | null;
  previous: number | null;
  floor: number;
  ceiling: number;
  least: number;
}

/**
 * Lays out a strip; null when nothing at all is known (no limit, no value, no previous).
 * @throws RangeError when a number is not finite or a lower limit lies above its upper one
 * @example wellStripScale({ value: 13.4, toleranceLow: 12, toleranceHigh: 14 })?.band?.from === 0.3
 */
export function wellStripScale(input: WellStripInput): WellStripScale | null {
  const known = read(input);
  const domain = chooseDomain(known);
  if (domain === null) return null;
  const [min, max] = domain;
  const share = (x: number) => (x - min) / (max - min);
  const inside = (x: number) => Math.min(1, Math.max(0, share(x)));
  const { low, high, watchLow, watchHigh, target, value, previous } = known;
  const anyLimit = low !== null || high !== null || watchLow !== null || watchHigh !== null;
  const from = low === null ? 0 : inside(low);
  const to = high === null ? 1 : inside(high);
  const shoulders: StripSpan[] = [];
  if (watchLow !== null && inside(watchLow) > from)
    shoulders.push({ from, to: Math.min(inside(watchLow), to) });
  if (watchHigh !== null && inside(watchHigh) < to)
    shoulders.push({ from: Math.max(inside(watchHigh), from), to });
  const onScale = (x: number | null) => (x !== null && x >= min && x <= max ? share(x) : null);
  return {
    min,
    max,
    band: anyLimit ? { from, to, hardFrom: low !== null, hardTo: high !== null } : null,
    shoulders,
    target: onScale(target),
    previous: previous === null ? null : onScale(previous),
    value: value === null ? null : inside(value),
    beyond: value === null ? null : value < min ? "low" : value > max ? "high" : null,
    ticks: chooseTicks(min, max).map((tick) => ({ ...tick, at: share(tick.value) })),
  };
}

const NUMBERS = [
  "value",
  "previous",
  "target",
  "toleranceLow",
  "toleranceHigh",
  "watchLow",
  "watchHigh",
  "possibleLow",
  "possibleHigh",
  "decimals",
] as const;

function read(input: WellStripInput): Known {
  for (const name of NUMBERS) {
    const x = input[name];
    if (x !== null && x !== undefined && !Number.isFinite(x))
      throw new RangeError(`${name} is not a finite number`);
  }
  const low = input.toleranceLow ?? null;
  const high = input.toleranceHigh ?? null;
  if (low !== null && high !== null && low > high)
    throw new RangeError("toleranceLow lies above toleranceHigh");
  return {
    low,
    high,
    watchLow: input.watchLow ?? null,
    watchHigh: input.watchHigh ?? null,
    target: input.target ?? null,
    value: input.value ?? null,
    previous: input.previous ?? null,
    floor: input.possibleLow ?? Number.NEGATIVE_INFINITY,
    ceiling: input.possibleHigh ?? Number.POSITIVE_INFINITY,
    least: 10 ** -(input.decimals ?? 1),
  };
}

function chooseDomain(known: Known): [number, number] | null {
  const { low, high, floor, ceiling, least } = known;
  if (low !== null && high !== null) {
    const margin = 0.75 * Math.max(high - low, 2 * least);
    return within(low - margin, high + margin, floor, ceiling);
  }
  if (high !== null) return within(...oneSided(high, known, floor, -1), floor, ceiling);
  if (low !== null) return within(...oneSided(low, known, ceiling, 1), floor, ceiling);
  return unlimited(known);
}

/** `side` -1: the open side is below the limit; 1: above it. */
function oneSided(limit: number, known: Known, bound: number, side: 1 | -1): [number, number] {
  const inner = [known.target, side < 0 ? known.watchHigh : known.watchLow]
    .filter((x) => x !== null)
    .map((x) => Math.abs(x - limit));
  const toBound = Math.abs(limit - bound);
  const fallback = Math.max(Math.abs(limit) / 2, 10 * known.least);
  const wanted = inner.length > 0 ? 2 * Math.max(...inner, known.least) : fallback;
  const depth = Math.max(Math.min(Number.isFinite(toBound) ? toBound : wanted, 4 * wanted), 2 * known.least);
  const beyond = (depth * 0.35) / 0.65;
  return side < 0 ? [limit - depth, limit + beyond] : [limit - beyond, limit + depth];
}

function unlimited(known: Known): [number, number] | null {
  const points = [known.value, known.previous, known.target, known.watchLow, known.watchHigh].filter(
    (x) => x !== null,
  );
  if (points.length === 0) return null;
  const lowest = Math.min(...points);
  const highest = Math.max(...points);
  const half = Math.max(
    highest - lowest,
    0.1 * Math.max(Math.abs(lowest), Math.abs(highest)),
    10 * known.least,
  );
  const middle = (lowest + highest) / 2;
  return within(middle - half, middle + half, known.floor, known.ceiling);
}

function within(min: number, max: number, floor: number, ceiling: number): [number, number] {
  const a = Math.max(min, floor);
  const b = Math.min(max, ceiling);
  return a < b ? [a, b] : [min, max];
}

/** Marks at 1, 2 or 5 times a power of ten, six to fifteen of them; every fifth multiple is long. */
function chooseTicks(min: number, max: number): { value: number; major: boolean }[] {
  const rough = (max - min) / 12;
  const power = 10 ** Math.floor(Math.log10(rough));
  const factor = [1, 2, 5, 10].find((f) => f * power >= rough) ?? 10;
  const step = factor * power;
  const ticks: { value: number; major: boolean }[] = [];
  for (let k = Math.ceil(min / step - 1e-9); k * step <= max + step * 1e-9; k += 1) {
    ticks.push({ value: Number((k * step).toPrecision(12)), major: k % 5 === 0 });
  }
  return ticks;
}
