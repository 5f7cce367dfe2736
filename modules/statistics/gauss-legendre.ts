/** Nodes and weights of a Gauss-Legendre rule on the interval from `from` to `to`. */
export interface Quadrature {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

/**
 * The Gauss-Legendre rule of `points` nodes between two bounds (Newton's method on the Legendre polynomials).
 *
 * Source: Abramowitz and Stegun 1964, 25.4.30. Checked: exact for polynomials of degree 2 points - 1.
 */
export function gaussLegendre(points: number, from: number, to: number): Quadrature {
  if (!(Number.isInteger(points) && points > 0)) throw new RangeError("A rule needs one node or more.");
  const nodes = new Float64Array(points);
  const weights = new Float64Array(points);
  const middle = (from + to) / 2;
  const half = (to - from) / 2;
  for (let i = 0; i < points; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (points + 0.5));
    let slope = 1;
    for (let pass = 0; pass < 100; pass++) {
      let previous = 1;
      let current = x;
      for (let k = 2; k <= points; k++) {
        const next = ((2 * k - 1) * x * current - (k - 1) * previous) / k;
        previous = current;
        current = next;
      }
      slope = points === 1 ? 1 : (points * (x * current - previous)) / (x * x - 1);
      const step = current / slope;
      x -= step;
      if (Math.abs(step) < 1e-15) break;
    }
    nodes[points - 1 - i] = middle + half * x;
    weights[points - 1 - i] = (2 * half) / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}
