/** IPTS-68 temperatures exceed ITS-90 ones by this factor (Saunders 1990, WOCE Newsletter 10, 10). */
export const IPTS68_PER_ITS90 = 1.00024;

/** 0 °C in kelvin. */
export const ZERO_CELSIUS_K = 273.15;

/**
 * A temperature of today's thermometers (ITS-90) on the scale of 1968, on which PSS-78, EOS-80 and their
 * companions are written.
 *
 * Units: °C both. Source: Saunders 1990. Checked: a conductivity salinity at 25 °C of gsw 3.6.16.
 * @example ipts68FromIts90(25) // => 25.006
 */
export function ipts68FromIts90(temperatureC: number): number {
  return temperatureC * IPTS68_PER_ITS90;
}

/**
 * A temperature of the scale of 1968 as today's thermometers (ITS-90) show it.
 *
 * Units: °C both. Source: Saunders 1990. Checked: inverse of ipts68FromIts90.
 * @example its90FromIpts68(25.006) // => 25
 */
export function its90FromIpts68(temperature68C: number): number {
  return temperature68C / IPTS68_PER_ITS90;
}
