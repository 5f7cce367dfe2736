import {
  addCatalogue,
  allParameters,
  createInstrument,
  createMethod,
  recordInstrumentCheck,
} from "@/modules/methods";
import { DAYS, type Stage } from "./stage";

const INSTRUMENTS = [
  ["TH-01", "Reference thermometer", "CS-10233", "platinum resistance", null, 180],
  ["RF-01", "Hand refractometer", "CS-20481", "refraction", "seawater", 7],
  ["RF-02", "Hand refractometer, brine", "CS-20502", "refraction", "brine (sodium chloride)", 7],
  ["PH-01", "pH meter, Shore", "CS-30117", "glass electrode", "NBS buffers", 7],
  ["PH-02", "pH meter, new probe", "CS-30164", "glass electrode", "NBS buffers", 7],
  ["OX-01", "Oxygen meter", "CS-40052", "luminescence", null, 7],
  ["RX-01", "Redox meter", "CS-50009", "platinum electrode", "silver chloride reference", 30],
  ["PM-01", "Bench photometer", "CS-60311", "absorbance", null, 30],
] as const;

const METHODS = [
  ["T-1", "temperature", "Thermometer in the stream", "Reading after one minute in moving water."],
  ["S-1", "salinity", "Refractometer", "Temperature-compensated refractometer, seawater scale."],
  [
    "PH-1",
    "ph_nbs",
    "Glass electrode",
    "Two buffers (NBS 4.01 and 7.00), reading stable within 0.01 for a minute.",
  ],
  ["OX-1", "oxygen", "Luminescence", "Optical sensor, salinity set on the meter."],
  ["NH-1", "ammonia_n", "Indophenol blue", "Absorbance after salicylate reaction."],
  ["NO-1", "nitrate", "Reduction and azo dye", "Absorbance after reduction to nitrite."],
  ["AL-1", "alkalinity", "Titration to pH 4.5", "Sulfuric acid, end point by electrode."],
  ["CA-1", "calcium", "Complexometric titration", "Titration with EDTA at pH 12."],
] as const;

/** The starter catalogue, written methods, instruments with weekly checks, and a probe that is found wrong. */
export function seedMethods(stage: Stage): void {
  const at = stage.moment(DAYS + 2, "10:00");
  stage.act("marek", at, addCatalogue, {});
  for (const each of allParameters(stage.db.writer.orm)) stage.parameterIds.set(each.code, each.id);
  for (const [code, parameter, name, principle] of METHODS) {
    const created = stage.act("priya", at, createMethod, {
      code,
      name,
      principle,
      parameterId: stage.parameter(parameter),
    });
    stage.methodIds.set(parameter, created.id);
  }
  for (const [code, name, serial, principle, scale, checkEveryDays] of INSTRUMENTS) {
    const created = stage.act("priya", at, createInstrument, {
      code,
      name,
      serial,
      principle,
      scale,
      checkEveryDays,
    });
    stage.instrumentIds.set(code, created.id);
  }
}

/** Weekly checks of the meters; PH-01 drifts and is taken out 31 days before today. */
export function seedChecks(stage: Stage): void {
  for (let daysAgo = DAYS - 1; daysAgo >= 0; daysAgo -= 7) {
    const at = stage.moment(daysAgo, "07:20");
    const drift = daysAgo < 76 && daysAgo > 31 ? (76 - daysAgo) * 0.006 : 0.01;
    check(
      stage,
      "PH-01",
      at,
      "ph_nbs",
      "Buffer NBS 7.00, lot 26-114",
      7,
      7 - drift,
      "pH",
      drift > 0.1 ? "adjusted" : "good",
    );
    check(stage, "OX-01", at, "oxygen_saturation", "Air-saturated seawater", 100, 99.2, "%", "good");
    check(stage, "RF-01", at, "salinity", "Reference seawater 35.0", 35, 35.1, "psu", "good");
  }
  const found = stage.moment(31, "11:05");
  check(stage, "PH-01", found, "ph_nbs", "Buffer NBS 7.00, lot 26-114", 7, 6.73, "pH", "failed");
  check(stage, "PH-02", found + 1_800_000, "ph_nbs", "Buffer NBS 7.00, lot 26-114", 7, 7.0, "pH", "good");
}

function check(
  stage: Stage,
  instrument: string,
  at: number,
  parameter: string,
  standard: string,
  standardValue: number,
  asFound: number,
  unit: string,
  verdict: "good" | "adjusted" | "failed",
): void {
  const found = Math.round(asFound * 100) / 100;
  stage.plan(at, () => {
    stage.act("priya", at, recordInstrumentCheck, {
      instrumentId: stage.instrumentIds.get(instrument) ?? 0,
      parameterId: stage.parameter(parameter),
      checkedAt: at,
      standard,
      standardValue,
      asFound: found,
      asLeft: verdict === "failed" ? found : standardValue,
      unit,
      verdict,
      note: verdict === "failed" ? "Slope 84 %; probe taken out of use." : "",
    });
  });
}
