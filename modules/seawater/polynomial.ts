/** Value of c0 + c1 x + c2 x² + … (Horner's scheme). */
export function polynomial(x: number, coefficients: readonly number[]): number {
  let value = 0;
  for (let i = coefficients.length - 1; i >= 0; i--) value = value * x + coefficients[i]!;
  return value;
}
