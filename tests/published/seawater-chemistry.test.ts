import { describe, expect, it } from "vitest";
import { convert } from "@/lib/units";
import {
  type AmmoniaFormula,
  alkalinityMeqPerL,
  ammoniumPKa,
  carbonateSystem,
  conductivityAt25MsPerCm,
  convertPH,
  densityKgPerM3,
  freshConductivityAt25MsPerCm,
  lnSeawaterConstant,
  type PHScale,
  practicalSalinity,
  type SeawaterConstant,
  totalDissolvedSolidsMgPerL,
  unionizedAmmonia,
  unionizedFromFraction,
} from "@/modules/seawater";
import { type Check, num, proveSection, word } from "./seawater-checks";

function ammonia(c: Check, formula: AmmoniaFormula, pHScale: PHScale, freshPsu?: number) {
  const { fraction, percent, pKa } = unionizedAmmonia({
    totalAmmoniaMgNPerL: 1,
    temperatureC: num(c, "T_C"),
    salinityPsu: freshPsu ?? num(c, "SP"),
    pH: num(c, "pH"),
    pHScale,
    formula,
  });
  return { fraction, percent, pKa };
}

proveSection("5_unionized_ammonia", "free ammonia", {
  f_emerson: (c) => ammonia(c, "emerson-1975", "nbs", 0),
  f_sw_table_bb78: (c) => ammonia(c, "bower-bidwell-1978", "nbs"),
  f_cw95_total: (c) => ammonia(c, "clegg-whitfield-1995", "total"),
  f_cw95_free: (c) => ammonia(c, "clegg-whitfield-1995", "free"),
  f_epa1989: (c) => ammonia(c, "epa-1989", "nbs"),
  pKa_bell2008: (c) => ({
    pKa: ammoniumPKa({
      formula: "bell-2008",
      pHScale: "nbs",
      temperatureC: num(c, "t_C"),
      salinityPsu: num(c, "SP"),
    }),
  }),
  pKa_ym95_sws: (c) => ({
    pKa: ammoniumPKa({
      formula: "yao-millero-1995",
      pHScale: "seawater",
      temperatureC: num(c, "T_C"),
      salinityPsu: num(c, "SP"),
    }),
  }),
  nh3_mass: (c) => {
    const { unionizedMgNPerL, unionizedMgNH3PerL } = unionizedFromFraction({
      totalAmmoniaMgNPerL: num(c, "TAN_N_mg_L"),
      fraction: num(c, "fraction"),
    });
    return { NH3_N_mg_L: unionizedMgNPerL, NH3_mg_L: unionizedMgNH3PerL };
  },
});

describe("the pH scale moves free ammonia by up to 30 %", () => {
  // Percent NH3 at pH 8.0, 25 °C, S 35 (computed outside the project with mpmath from the published formulas).
  const rows = [
    ["clegg-whitfield-1995", "total", 35, "mol/kg-water", 5.56],
    ["clegg-whitfield-1995", "total", 35, "mol/kg-seawater", 5.37],
    ["yao-millero-1995", "seawater", 35, undefined, 5.25],
    ["epa-1989", "nbs", 35, undefined, 4.53],
    ["clegg-whitfield-1995", "free", 35, undefined, 4.4],
    ["bower-bidwell-1978", "nbs", 34, undefined, 4.28],
    ["bell-2008", "nbs", 35, undefined, 4.17],
  ] as const;
  it.each(rows)(
    "%s on the %s scale at S %d (%s) gives %d %%",
    (formula, pHScale, salinityPsu, concentrationBasis, wanted) => {
      const { percent } = unionizedAmmonia({
        totalAmmoniaMgNPerL: 1,
        temperatureC: 25,
        salinityPsu,
        pH: 8,
        pHScale,
        formula,
        concentrationBasis,
      });
      expect(Math.abs(percent - wanted)).toBeLessThanOrEqual(0.02);
    },
  );

  it("gives the same free ammonia within 0.5 % on the total and the free scale (the two fits of Clegg & Whitfield 1995)", () => {
    const at = { totalAmmoniaMgNPerL: 1, temperatureC: 25, salinityPsu: 35 };
    const free = convertPH({ ...at, pH: 8, from: "total", to: "free" });
    const onTotal = unionizedAmmonia({
      ...at,
      pH: 8,
      pHScale: "total",
      concentrationBasis: "mol/kg-seawater",
    });
    const onFree = unionizedAmmonia({
      ...at,
      pH: free,
      pHScale: "free",
      concentrationBasis: "mol/kg-seawater",
    });
    expect(Math.abs(onFree.fraction / onTotal.fraction - 1)).toBeLessThan(0.005);
  });
});

const CONSTANT_NAMES: Readonly<Record<string, SeawaterConstant>> = {
  KspA: "KspAragonite",
  KspC: "KspCalcite",
};

proveSection("6_carbonate_system", "the carbonate system", {
  lnK: (c) => ({
    lnK: lnSeawaterConstant({
      constant: CONSTANT_NAMES[word(c, "name")] ?? (word(c, "name") as SeawaterConstant),
      temperatureC: num(c, "T_C"),
      salinityPsu: num(c, "SP"),
    }),
  }),
  K0_weiss: (c) => ({
    K0x100:
      100 *
      Math.exp(
        lnSeawaterConstant({ constant: "K0", temperatureC: num(c, "T_C"), salinityPsu: num(c, "SP") }),
      ),
  }),
  carb_TA_pH: (c) => {
    const at = { temperatureC: num(c, "T_C"), salinityPsu: num(c, "SP") };
    const system = carbonateSystem({
      alkalinityMeqPerL: (num(c, "TA_umol_kg") * densityKgPerM3(at)) / 1e6,
      pH: num(c, "pH_total"),
      pHScale: "total",
      ...at,
      boron: word(c, "boron") === "U74" ? "uppstrom-1974" : "lee-2010",
    });
    return {
      DIC: system.dicUmolPerKg,
      HCO3: system.bicarbonateUmolPerKg,
      CO3: system.carbonateUmolPerKg,
      fCO2: system.fco2Uatm,
      pCO2: system.pco2Uatm,
      OmegaA: system.omegaAragonite,
      OmegaC: system.omegaCalcite,
    };
  },
});

describe("constants at S 35, 25 °C (Dickson, Sabine & Christian 2007; Zeebe & Wolf-Gladrow 2001)", () => {
  const rows = [
    ["K2", -20.6449, 6e-5],
    ["KW", -30.434, 6e-4],
    ["KF", -6.09, 6e-3],
    ["KP1", -3.71, 6e-3],
    ["KP3", -20.24, 6e-3],
    ["KSi", -21.61, 6e-3],
    ["KspCalcite", -14.6659, 6e-5],
  ] as const;
  it.each(rows)("ln %s is %d", (constant, wanted, tolerance) => {
    const got = lnSeawaterConstant({ constant, temperatureC: 25, salinityPsu: 35 });
    expect(Math.abs(got - wanted)).toBeLessThanOrEqual(tolerance);
  });
});

describe("pH scales", () => {
  it("put total 0.108 below free at S 35, 25 °C (Dickson 1990, computed)", () => {
    const free = convertPH({ pH: 8, from: "total", to: "free", temperatureC: 25, salinityPsu: 35 });
    expect(Math.abs(free - 8 - 0.108)).toBeLessThanOrEqual(6e-4);
  });

  it("put NBS above seawater by −log fH, fH = 1.2948 − 0.002036 T + (0.0004607 − 0.000001475 T) S² (Takahashi et al. 1982)", () => {
    const nbs = convertPH({ pH: 8, from: "seawater", to: "nbs", temperatureC: 25, salinityPsu: 35 });
    const fH = 1.2948 - 0.002036 * 298.15 + (0.0004607 - 0.000001475 * 298.15) * 1225;
    expect(nbs).toBeCloseTo(8 - Math.log10(fH), 10);
  });
});

/** How the units of the checks are called here. */
const UNITS: Readonly<Record<string, string>> = {
  "mg/L as CaCO3": "mg/L CaCO3",
  "Clark (English) degree": "°Clark",
  "French degree": "°fH",
  "umol/L NO3": "µmol/L NO3",
  degF: "°F",
  degC: "°C",
  m3: "m³",
  ft3: "ft³",
  "m3/h": "m³/h",
};

function converted(c: Check): number {
  const from = word(c, "from");
  const to = word(c, "to");
  if (to === "mmol/L CaCO3") return convert(num(c, "value"), "mg/L CaCO3", "meq/L") / 2;
  if (from === "mg/L Ca" && to === "mg/L as CaCO3") {
    return convert(num(c, "value"), "mg/L Ca", "mg/L Ca as CaCO3");
  }
  const pair = from === "mg/L NH4-N" ? "mg/L NH3-N" : (UNITS[from] ?? from);
  return convert(num(c, "value"), pair, UNITS[to] ?? to);
}

proveSection("7_unit_conversions", "units and conductivity at 25 °C", {
  convert: (c) => ({ value: converted(c) }),
  k25_linear: (c) => ({
    k25_mS_cm: freshConductivityAt25MsPerCm({
      conductivityMsPerCm: num(c, "k_mS_cm"),
      temperatureC: num(c, "t_C"),
      coefficientPerC: num(c, "alpha_per_C"),
    }),
  }),
  k25_seawater: (c) => {
    const at = { conductivityMsPerCm: num(c, "C_mS_cm"), temperatureC: num(c, "t90_C") };
    return { C25_mS_cm: conductivityAt25MsPerCm(at), SP: practicalSalinity(at) };
  },
  tds_ppm: (c) => ({
    ppm: totalDissolvedSolidsMgPerL({
      conductivityAt25UsPerCm: num(c, "EC25_uS_cm"),
      factor: num(c, "factor"),
    }),
  }),
  umolkg_to_meqL: (c) => ({
    meq_L: alkalinityMeqPerL({
      alkalinityUmolPerKg: num(c, "TA_umol_kg"),
      densityKgPerM3: num(c, "rho_kg_m3"),
    }),
  }),
});
