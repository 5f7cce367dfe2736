const MOST_HALVINGS = 200;

/**
 * The argument at which a rising function reaches a target, by halving: it cannot run away, and ends at the
 * neighbouring floating point numbers. The caller has made sure that f(low) <= target <= f(high) but for rounding.
 */
export function whereRisingReaches(
  target: number,
  low: number,
  high: number,
  f: (argument: number) => number,
): number {
  if (f(low) >= target) return low;
  if (f(high) <= target) return high;
  let below = low;
  let above = high;
  for (let i = 0; i < MOST_HALVINGS; i++) {
    const middle = below + (above - below) / 2;
    if (middle === below || middle === above) break;
    if (f(middle) < target) below = middle;
    else above = middle;
  }
  return target - f(below) < f(above) - target ? below : above;
}
