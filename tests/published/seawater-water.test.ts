import { describe, expect, it } from "vitest";
import {
  barometricPressureKPa,
  brineScaleReadingGPerKg,
  conductivityMsPerCm,
  conductivityRatio,
  densityKgPerM3,
  freezingPointC,
  hydrometerSpecificGravity,
  oxygenSaturationMgPerL,
  oxygenSaturationPercent,
  oxygenSolubility,
  practicalSalinity,
  practicalSalinityFromRatio,
  refractiveIndex,
  salinityFromBrineScale,
  salinityFromDensity,
  salinityFromRefractiveIndex,
  salinityFromSpecificGravity,
  sodiumChlorideRefractiveIndex,
  specificGravity,
  specificHeatJPerKgK,
  totalGasPressurePercent,
} from "@/modules/seawater";
import { checksOf, num, onIts90, proveSection, word } from "./seawater-checks";

const MMHG_KPA = 0.133322387;
const ATM_KPA = 101.325;

proveSection("1_practical_salinity_pss78", "practical salinity", {
  sp_from_R: (c) => ({
    SP: practicalSalinityFromRatio({
      conductivityRatio: num(c, "R"),
      temperatureC: onIts90(num(c, "t68_C")),
      pressureDbar: num(c, "p_dbar"),
    }),
  }),
  R_from_sp: (c) => ({
    R: conductivityRatio({
      salinityPsu: num(c, "SP"),
      temperatureC: onIts90(num(c, "t68_C")),
      pressureDbar: num(c, "p_dbar"),
    }),
  }),
  sp_from_C: (c) => ({
    SP: practicalSalinity({
      conductivityMsPerCm: num(c, "C_mS_cm"),
      temperatureC: num(c, "t90_C"),
      pressureDbar: num(c, "p_dbar"),
    }),
  }),
  C_from_sp: (c) => ({
    C_mS_cm: conductivityMsPerCm({
      salinityPsu: num(c, "SP"),
      temperatureC: num(c, "t90_C"),
      pressureDbar: num(c, "p_dbar"),
    }),
  }),
});

proveSection("2_density_eos80_and_specific_gravity", "density and specific gravity", {
  rho: (c) => ({
    rho_kg_m3: densityKgPerM3({
      salinityPsu: num(c, "SP"),
      temperatureC: onIts90(num(c, "t68_C")),
      pressureDbar: num(c, "p_dbar"),
    }),
  }),
  rho_t90: (c) => ({
    rho_kg_m3: densityKgPerM3({ salinityPsu: num(c, "SP"), temperatureC: num(c, "t90_C") }),
  }),
  sg: (c) => ({
    SG: specificGravity({
      salinityPsu: num(c, "SP"),
      temperatureC: num(c, "t_sample_C"),
      referenceTemperatureC: num(c, "t_ref_C"),
    }),
  }),
  sp_from_sg: (c) => ({
    SP: salinityFromSpecificGravity({
      specificGravity: num(c, "SG"),
      temperatureC: num(c, "t_sample_C"),
      referenceTemperatureC: num(c, "t_ref_C"),
    }),
  }),
  sp_from_rho: (c) => ({
    SP: salinityFromDensity({ densityKgPerM3: num(c, "rho_kg_m3"), temperatureC: num(c, "t90_C") }),
  }),
});

describe("density beside TEOS-10 (gsw 3.6.16)", () => {
  for (const check of checksOf("2_density_eos80_and_specific_gravity").filter(({ alt }) => alt)) {
    it(`${check.id} lies within the known 0.009 kg/m³ of TEOS-10 (${check.src})`, () => {
      const ours = densityKgPerM3({ salinityPsu: num(check, "SP"), temperatureC: num(check, "t90_C") });
      expect(Math.abs(ours - check.alt!.teos10_rho!)).toBeLessThan(0.009);
    });
  }
});

const index = (c: Parameters<typeof num>[0], formula: "quan-fry-1995" | "millard-seaver-1990") => ({
  n: refractiveIndex({
    salinityPsu: num(c, "SP"),
    temperatureC: num(c, "T_C"),
    wavelengthNm: num(c, "lambda_nm"),
    formula,
  }),
});

proveSection("3_refractive_index", "refraction and the brine scale", {
  n_quan_fry: (c) => index(c, "quan-fry-1995"),
  n_millard_seaver: (c) => index(c, "millard-seaver-1990"),
  nacl_n: (c) => ({ n: sodiumChlorideRefractiveIndex({ massPercent: num(c, "mass_percent") }) }),
  brine_reading: (c) => ({ g_NaCl_per_kg: brineScaleReadingGPerKg({ salinityPsu: num(c, "SP") }) }),
  sp_from_brine_reading: (c) => ({
    SP: salinityFromBrineScale({ readingGPerKg: num(c, "g_NaCl_per_kg") }).salinityPsu,
  }),
  sp_from_n_quan_fry: (c) => ({
    SP: salinityFromRefractiveIndex({
      refractiveIndex: num(c, "n"),
      temperatureC: num(c, "T_C"),
      wavelengthNm: num(c, "lambda_nm"),
    }),
  }),
});

proveSection("4_dissolved_oxygen_saturation", "oxygen and gas pressure", {
  do_sat: (c) => ({
    mg_L: oxygenSaturationMgPerL({ temperatureC: num(c, "T_C"), salinityPsu: num(c, "SP") }),
  }),
  do_sat_p: (c) => ({
    mg_L: oxygenSaturationMgPerL({
      temperatureC: num(c, "T_C"),
      salinityPsu: num(c, "SP"),
      pressureKPa: ATM_KPA * num(c, "P_atm"),
    }),
  }),
  percent_sat: (c) => ({
    percent: oxygenSaturationPercent({
      oxygenMgPerL: num(c, "DO_mg_L"),
      temperatureC: num(c, "T_C"),
      salinityPsu: num(c, "SP"),
      pressureKPa: ATM_KPA * num(c, "P_atm"),
    }),
  }),
  // Garcia and Gordon's temperatures are on IPTS-68.
  do_gg92: (c) => ({
    value: oxygenSolubility({
      temperatureC: onIts90(num(c, "T_C")),
      salinityPsu: num(c, "SP"),
      unit: word(c, "unit") === "mL/L" ? "mL/L" : "umol/kg",
      fit: word(c, "fit") === "BK" ? "benson-krause" : "combined",
    }),
  }),
  baro_from_altitude: (c) => {
    const pressureKPa = barometricPressureKPa({ altitudeM: num(c, "h_m") });
    return { P_kPa: pressureKPa, P_atm: pressureKPa / ATM_KPA };
  },
  tgp_percent: (c) => ({
    // The ratio does not depend on the unit; the first row is in mmHg, the second in kPa.
    percent: totalGasPressurePercent({
      barometricPressureKPa: num(c, "BP") * (num(c, "BP") > 200 ? MMHG_KPA : 1),
      excessPressureKPa: num(c, "deltaP") * (num(c, "BP") > 200 ? MMHG_KPA : 1),
    }),
  }),
});

describe("oxygen solubility of the combined fit", () => {
  it("gives the paper's check values 274.647 µmol/kg and 6.316 mL/L at 10 °C, S 35 (Garcia & Gordon 1992)", () => {
    const at = { temperatureC: onIts90(10), salinityPsu: 35, fit: "combined" } as const;
    // The printed constant A0 has six figures: half of its last digit alone is 0.0014 µmol/kg.
    expect(Math.abs(oxygenSolubility({ ...at, unit: "umol/kg" }) - 274.647)).toBeLessThanOrEqual(0.0014);
    expect(Math.abs(oxygenSolubility({ ...at, unit: "mL/L" }) - 6.316)).toBeLessThanOrEqual(0.0005);
  });
});

proveSection("9_specific_heat", "heat capacity", {
  cp: (c) => ({
    cp: specificHeatJPerKgK({ salinityPsu: num(c, "SP"), temperatureC: onIts90(num(c, "t68_C")) }),
  }),
});

proveSection("10_freezing_point", "freezing point", {
  // The formula answers on IPTS-68, ours on ITS-90.
  t_freeze: (c) => ({
    t_C: 1.00024 * freezingPointC({ salinityPsu: num(c, "SP"), pressureDbar: num(c, "p_dbar") }),
  }),
});

describe("glass hydrometers (common practice, no source)", () => {
  it("show too little in warm water by the glass's expansion, 25e-6 per °C", () => {
    const corrected = hydrometerSpecificGravity({
      reading: 1.025,
      sampleTemperatureC: 25,
      calibrationTemperatureC: 15,
      referenceTemperatureC: 15,
    });
    expect(corrected).toBeCloseTo(1.025 * (1 - 25e-6 * 10), 12);
  });
});
