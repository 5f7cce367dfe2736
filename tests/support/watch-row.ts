import type { Bounds, RecentReading, WatchRow } from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";

export const HOUR = 3_600_000;

type Some = Partial<FacilityParameter> & {
  bounds?: Bounds;
  recent?: RecentReading[];
  pointId?: number;
  systemCode?: string;
};

/** A row of an entry sheet for tests beside the components: limits in force where bounds are given. */
export function aWatchRow({
  bounds,
  recent = [],
  pointId = 1,
  systemCode = "KELP-01",
  ...more
}: Some = {}): WatchRow {
  const parameter: FacilityParameter = {
    id: 1,
    code: "temperature",
    name: "Temperature",
    kind: "number",
    unit: "°C",
    acceptedUnits: ["°C"],
    decimals: 1,
    plausible: { low: null, high: null },
    choices: [],
    group: "physics",
    mayBeNegative: true,
    note: "",
    isRetired: false,
    ...more,
  };
  return {
    pointId,
    pointName: "Surface",
    isDefaultPoint: true,
    systemId: pointId,
    systemCode,
    systemName: "Kelp forest",
    systemState: "in-service",
    areaId: 1,
    areaName: "Kelp gallery",
    parameter,
    unit: parameter.unit,
    everyDays: 1,
    methodId: null,
    instrumentId: null,
    limits: bounds ? { state: "in-force", versionId: 1, version: 1, bounds } : { state: "none" },
    recent,
  };
}

/** One earlier reading. */
export function aReading(more: Partial<RecentReading> & { takenAt: number }): RecentReading {
  return {
    id: more.takenAt,
    takenBy: 1,
    value: null,
    qualifier: "",
    answer: null,
    typedText: String(more.value ?? ""),
    status: "within",
    side: null,
    sentence: "",
    ...more,
  };
}
