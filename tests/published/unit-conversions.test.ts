import { describe, expect, it } from "vitest";
import { convert } from "@/lib/units";

/**
 * Values computed outside this project from the definitions: exact definitions of units (BIPM SI Brochure, NIST SP 811,
 * 231 in³ US gallon, 4.54609 L imperial gallon, conventional mercury) and stoichiometry with the CIAAW abridged
 * standard atomic weights 2021 (recalled from memory, within 0.03 % of two published IUPAC 2005 tables).
 * Columns: value, from, to, expected, absolute tolerance, source.
 */
const CHECKS: readonly (readonly [number, string, string, number, number, string])[] = [
  [2.5, "meq/L", "mg/L CaCO3", 125.1075, 0.0001, "stoichiometry, CIAAW 2021"],
  [2.5, "meq/L", "dKH", 7.009625, 0.000001, "stoichiometry, CIAAW 2021"],
  [7, "dKH", "mg/L CaCO3", 124.9357134, 1e-6, "stoichiometry, CIAAW 2021"],
  [1, "dKH", "meq/L", 0.356652, 1e-6, "10 mg/L CaO per degree"],
  [10, "°Clark", "mg/L CaCO3", 142.5376752, 0.000143, "1 grain CaCO3 per imperial gallon"],
  [125, "mg/L CaCO3", "°fH", 12.5, 1.25e-8, "10 mg/L CaCO3 per French degree"],
  [420, "mg/L Ca", "mmol/L Ca", 10.47956485, 1e-7, "stoichiometry, CIAAW 2021"],
  [1300, "mg/L Mg", "mmol/L Mg", 53.48693684, 1e-7, "stoichiometry, CIAAW 2021"],
  [412, "mg/L Ca", "mg/L Ca as CaCO3", 1028.879485, 1e-5, "stoichiometry, CIAAW 2021"],
  [10, "mg/L NO3-N", "mg/L NO3", 44.26643821, 1e-7, "stoichiometry, CIAAW 2021"],
  [0.1, "mg/L NO2-N", "mg/L NO2", 0.3284429214, 1e-9, "stoichiometry, CIAAW 2021"],
  [1, "mg/L NH3-N", "mg/L NH3", 1.215892054, 1e-8, "stoichiometry, CIAAW 2021"],
  [1, "mg/L NH3-N", "mg/L NH4", 1.287856072, 1e-8, "stoichiometry, CIAAW 2021"],
  [0.05, "mg/L PO4-P", "mg/L PO4", 0.1533059986, 1e-9, "stoichiometry, CIAAW 2021"],
  [50, "µg/L P", "mg/L PO4", 0.1533059986, 1e-9, "stoichiometry, CIAAW 2021"],
  [2, "µmol/L NO3", "mg/L NO3-N", 0.028014, 1e-9, "stoichiometry, CIAAW 2021"],
  [78, "°F", "°C", 25.55555556, 2.56e-8, "exact"],
  [64.4, "°F", "°C", 18, 1e-9, "exact"],
  [25, "°C", "K", 298.15, 2.98e-7, "exact"],
  [100, "US gal", "L", 378.5411784, 3.79e-7, "exact, 231 in³"],
  [50, "imp gal", "L", 227.3045, 2.27e-7, "exact"],
  [2.5, "m³", "US gal", 660.4301309, 6.6e-7, "exact"],
  [10, "ft³", "L", 283.1684659, 2.83e-7, "exact"],
  [50, "lb", "kg", 22.6796185, 2.27e-8, "exact"],
  [8, "oz", "g", 226.796185, 2.27e-7, "exact"],
  [100, "US gpm", "L/min", 378.5411784, 3.79e-7, "exact"],
  [5, "L/s", "m³/h", 18, 1.8e-8, "exact"],
  [30, "psi", "kPa", 206.8427188, 2.07e-7, "pound-force per square inch, exact inputs"],
  [29.92, "inHg", "kPa", 101.3207481, 1.01e-6, "conventional inch of mercury at 0 °C"],
  [1, "mmHg", "kPa", 0.133322387, 1e-9, "conventional millimetre of mercury"],
  [1, "mL/L O2", "mg/L O2", 1.42905, 1e-9, "Benson & Krause 1984; Garcia & Gordon 1992"],
  [35, "psu", "g/kg", 35.16504, 1e-9, "Millero et al. 2008, reference composition"],
];

describe("unit conversions against definitions and stoichiometry", () => {
  it.each(CHECKS)("%d %s in %s is %d", (value, from, to, expected, tolerance) => {
    expect(Math.abs(convert(value, from, to) - expected)).toBeLessThanOrEqual(tolerance);
    expect(Math.abs(convert(expected, to, from) - value)).toBeLessThanOrEqual(
      (tolerance / expected) * value + 1e-7,
    );
  });

  it("alkalinity uses 50.043 mg/L CaCO3 per meq/L, not the 100 printed in one clinical guide", () => {
    // Hadfield 2021, Appendix A2 says 100; two equivalents per mole give half of 100.086.
    expect(convert(1, "meq/L", "mg/L CaCO3")).toBeCloseTo(50.043, 3);
  });
});
