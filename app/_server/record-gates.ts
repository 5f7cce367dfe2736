import "server-only";
import type { RecordGates } from "@/modules/audit";
import { importsMay } from "@/modules/imports";
import { measurementsMay } from "@/modules/measurements";
import { methodsMay } from "@/modules/methods";
import { qualityMay } from "@/modules/quality";
import { roundsMay } from "@/modules/rounds";
import { systemsMay } from "@/modules/systems";

const [seeWater, seeReadings] = [systemsMay.read, measurementsMay.read];
const ofSystem = ["system_id", "systems_system"] as const;
const ofPoint = ["point_id", "systems_point"] as const;
const ofReading = ["reading_id", "measurements_reading"] as const;
const ofIncident = ["incident_id", "quality_incident"] as const;

/**
 * Whose record's history may be read by whoever may see the record: the permission, and the way from the record to its area.
 * Tables that tell of people (identity), signatures and the product's own work are not here: they are open to those alone who
 * read the whole history.
 */
export const RECORD_GATES: RecordGates = {
  systems_site: { may: seeWater },
  systems_area: { may: seeWater, area: "itself" },
  systems_system: { may: seeWater, area: ["area_id", "systems_area"] },
  systems_point: { may: seeWater, area: ofSystem },
  systems_equipment: { may: seeWater, area: ofSystem },
  systems_operating_level: { may: seeWater, area: ofSystem },
  systems_volume_determination: { may: seeWater, area: ofSystem },
  systems_join: { may: seeWater, area: ["one_system_id", "systems_system"] },
  measurements_reading: { may: seeReadings, area: ofPoint },
  measurements_judgement: { may: seeReadings, area: ofReading },
  measurements_explanation: { may: seeReadings, area: ofReading },
  measurements_watch_item: { may: seeReadings, area: ofPoint },
  measurements_limit_version: { may: seeReadings, area: ofPoint },
  // A workbook may speak of several areas: its history is for those who work on limits everywhere.
  measurements_limit_workbook: { may: measurementsMay.proposeLimits },
  measurements_limit_template: { may: seeReadings },
  imports_import: { may: importsMay.read },
  imports_file: { may: importsMay.read },
  methods_parameter: { may: methodsMay.read },
  methods_method: { may: methodsMay.read },
  methods_instrument: { may: methodsMay.read },
  methods_instrument_check: { may: methodsMay.read },
  quality_incident: { may: qualityMay.read, area: ofSystem },
  quality_incident_note: { may: qualityMay.read, area: ofIncident },
  quality_incident_reading: { may: qualityMay.read, area: ofIncident },
  rounds_day_review: { may: roundsMay.read, area: ["area_id", "systems_area"] },
};
