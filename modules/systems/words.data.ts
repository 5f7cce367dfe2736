import type { EquipmentKind, PointKind, SystemKind, SystemState, WaterType } from "./model";

/** Codes as words on screen. */
export const SYSTEM_KIND_WORDS: Readonly<Record<SystemKind, string>> = {
  exhibit: "exhibit",
  holding: "holding",
  quarantine: "quarantine",
  reservoir: "reservoir",
  "mixing-tank": "mixing tank",
};
export const WATER_TYPE_WORDS: Readonly<Record<WaterType, string>> = {
  seawater: "seawater",
  brackish: "brackish water",
  fresh: "fresh water",
};
export const SYSTEM_STATE_WORDS: Readonly<Record<SystemState, string>> = {
  "in-service": "in service",
  "out-of-service": "out of service",
  retired: "retired",
};
export const EQUIPMENT_KIND_WORDS: Readonly<Record<EquipmentKind, string>> = {
  pump: "pump",
  filter: "filter",
  skimmer: "skimmer",
  "ozone-generator": "ozone generator",
  "contact-chamber": "contact chamber",
  uv: "UV steriliser",
  heater: "heater",
  chiller: "chiller",
  sump: "sump",
  biofilter: "biofilter",
  "degassing-tower": "degassing tower",
  aerator: "aerator",
  "dosing-unit": "dosing unit",
  probe: "probe",
  other: "other",
};
export const POINT_KIND_WORDS: Readonly<Record<PointKind, string>> = {
  surface: "surface",
  "mid-water": "mid-water",
  bottom: "bottom",
  inlet: "inlet",
  outlet: "outlet",
  "filter-outlet": "filter outlet",
  "contact-chamber": "ozone contact chamber",
  sump: "sump",
  "return-line": "return line",
  other: "other",
};
