import type { Bounds } from "@/modules/measurements/model";

export type AreaSeed = { code: string; name: string; biosecurityLevel: number };
/** In walking order, clean to quarantine last. */
export const AREAS: readonly AreaSeed[] = [
  { code: "SHORE", name: "Shore gallery", biosecurityLevel: 1 },
  { code: "REEF", name: "Reef hall", biosecurityLevel: 1 },
  { code: "DEEP", name: "Deep hall", biosecurityLevel: 1 },
  { code: "DRIFT", name: "Drift hall and larval research", biosecurityLevel: 2 },
  { code: "QUAR", name: "Reservoir and quarantine", biosecurityLevel: 3 },
];

/** How one parameter runs at one point: a level, a swing over the year, day-to-day noise with memory, and its limits. */
export type SeriesSeed = {
  parameter: string;
  /** Point code; the default point where it is left out. */
  point?: string;
  everyDays: number;
  base: number;
  season?: number;
  noise: number;
  /** Lag-1 autocorrelation of the noise. */
  memory?: number;
  trendPerDay?: number;
  limits?: Bounds;
  /** Read a second time in the afternoon. */
  twice?: boolean;
};

export type SystemSeed = {
  code: string;
  name: string;
  area: string;
  kind: "exhibit" | "holding" | "quarantine" | "reservoir";
  points: readonly (readonly [
    code: string,
    name: string,
    kind: "surface" | "bottom" | "filter-outlet" | "contact-chamber" | "sump",
  ])[];
  /** Inner length, width and depth of water in metres, or diameter and depth of a round tank. */
  tank: { box: readonly [number, number, number] } | { round: readonly [number, number] };
  equipment: readonly (readonly [
    code: string,
    name: string,
    kind: "pump" | "filter" | "skimmer" | "ozone-generator" | "chiller" | "heater" | "uv",
  ])[];
  series: readonly SeriesSeed[];
};

const around = (target: number, watch: number, tolerance: number, greatestChange24h?: number): Bounds => ({
  target,
  watchLow: target - watch,
  watchHigh: target + watch,
  toleranceLow: target - tolerance,
  toleranceHigh: target + tolerance,
  ...(greatestChange24h === undefined ? {} : { greatestChange24h }),
});

/** Invented limits in the range of common practice, no source: a facility sets its own. */
const temperature = (base: number, season: number, twice = false): SeriesSeed => ({
  parameter: "temperature",
  everyDays: 1,
  base,
  season,
  noise: 0.16,
  memory: 0.6,
  twice,
  limits: around(base, 1.2 + season, 2 + season, 1.2),
});
const salinity = (base = 34.4, target = 34.5): SeriesSeed => ({
  parameter: "salinity",
  everyDays: 1,
  base,
  noise: 0.18,
  memory: 0.75,
  limits: around(target, 0.9, 1.5, 1),
});
const ph = (base = 8.1): SeriesSeed => ({
  parameter: "ph_nbs",
  everyDays: 1,
  base,
  noise: 0.03,
  memory: 0.5,
  limits: { target: 8.1, watchLow: 7.9, watchHigh: 8.3, toleranceLow: 7.8, toleranceHigh: 8.4 },
});
const oxygen = (base: number, point?: string): SeriesSeed => ({
  parameter: "oxygen",
  ...(point ? { point } : {}),
  everyDays: 1,
  base,
  noise: 0.14,
  memory: 0.4,
  limits: { target: base, watchLow: base - 0.7, toleranceLow: base - 1.2, toleranceHigh: base + 2.5 },
});
const orp = (point?: string): SeriesSeed => ({
  parameter: "orp",
  ...(point ? { point } : {}),
  everyDays: 1,
  base: 325,
  noise: 11,
  memory: 0.5,
  limits: { target: 325, watchLow: 270, watchHigh: 380, toleranceLow: 230, toleranceHigh: 420 },
});
const pump: SeriesSeed = { parameter: "pump_running", everyDays: 1, base: 1, noise: 0 };
const ammonia: SeriesSeed = {
  parameter: "ammonia_n",
  everyDays: 7,
  base: 0.021,
  noise: 0.006,
  limits: { watchHigh: 0.05, toleranceHigh: 0.1 },
};
const nitrate = (base: number, trendPerDay = 0): SeriesSeed => ({
  parameter: "nitrate",
  everyDays: 7,
  base,
  noise: 0.9,
  trendPerDay,
  limits: { watchHigh: 40, toleranceHigh: 60 },
});
const alkalinity = (base = 2.4): SeriesSeed => ({
  parameter: "alkalinity",
  everyDays: 7,
  base,
  noise: 0.06,
  memory: 0.5,
  limits: { target: 2.5, watchLow: 2.1, watchHigh: 3.1, toleranceLow: 1.9, toleranceHigh: 3.4 },
});
const calcium: SeriesSeed = {
  parameter: "calcium",
  everyDays: 7,
  base: 418,
  noise: 6,
  memory: 0.5,
  limits: { target: 420, watchLow: 390, watchHigh: 450, toleranceLow: 370, toleranceHigh: 480 },
};
/** Recorded without limits: it shows the status "no limits". */
const light: SeriesSeed = { parameter: "photon_flux", everyDays: 7, base: 240, noise: 14 };
const enterococci: SeriesSeed = {
  parameter: "enterococci",
  everyDays: 14,
  base: 12,
  noise: 6,
  limits: { watchHigh: 35, toleranceHigh: 100 },
};

const main = [["SURFACE", "Surface", "surface"]] as const;
const deep = [...main, ["BOTTOM", "Bottom", "bottom"]] as const;
const pumpAnd = (...more: SystemSeed["equipment"]): SystemSeed["equipment"] => [
  ["P1", "Circulation pump 1", "pump"],
  ["F1", "Sand filter 1", "filter"],
  ...more,
];

export const SYSTEMS: readonly SystemSeed[] = [
  {
    code: "KELP-01",
    name: "Kelp forest, main tank",
    area: "SHORE",
    kind: "exhibit",
    points: [...deep, ["CONTACT", "Ozone contact chamber", "contact-chamber"]],
    tank: { box: [11.2, 6.4, 4.33] },
    equipment: pumpAnd(
      ["P2", "Circulation pump 2", "pump"],
      ["O1", "Ozone generator", "ozone-generator"],
      ["C1", "Chiller", "chiller"],
    ),
    series: [
      temperature(13.4, 0.9),
      salinity(),
      ph(),
      oxygen(7.9),
      oxygen(7.3, "BOTTOM"),
      orp("CONTACT"),
      pump,
      ammonia,
      nitrate(14),
    ],
  },
  {
    code: "KELP-02",
    name: "Rock pool touch tank",
    area: "SHORE",
    kind: "exhibit",
    points: main,
    tank: { box: [6.5, 3.1, 0.6] },
    equipment: pumpAnd(),
    series: [temperature(14.1, 1), salinity(34.2), ph(8.08), oxygen(7.8), pump, enterococci],
  },
  {
    code: "SEAL-01",
    name: "Seal pool",
    area: "SHORE",
    kind: "exhibit",
    points: [...main, ["OUTLET", "Filter outlet", "filter-outlet"]],
    tank: { round: [17.2, 2.9] },
    equipment: pumpAnd(["O1", "Ozone generator", "ozone-generator"]),
    series: [temperature(13, 2.4), salinity(33.9), ph(8.02), orp("OUTLET"), pump, enterococci],
  },
  {
    code: "REEF-01",
    name: "Reef lagoon",
    area: "REEF",
    kind: "exhibit",
    points: deep,
    tank: { box: [9.4, 4.6, 2.2] },
    equipment: pumpAnd(["S1", "Protein skimmer", "skimmer"], ["H1", "Heater", "heater"]),
    series: [
      temperature(25.2, 0.2, true),
      salinity(35),
      ph(8.14),
      oxygen(6.7),
      pump,
      alkalinity(2.55),
      calcium,
      nitrate(6),
      light,
    ],
  },
  {
    code: "REEF-02",
    name: "Coral nursery",
    area: "REEF",
    kind: "holding",
    points: main,
    tank: { box: [4.8, 1.9, 0.72] },
    equipment: pumpAnd(["S1", "Protein skimmer", "skimmer"]),
    series: [
      temperature(25.4, 0.1, true),
      salinity(35.1),
      ph(8.16),
      oxygen(6.6),
      pump,
      alkalinity(2.61),
      calcium,
      ammonia,
      light,
    ],
  },
  {
    code: "REEF-03",
    name: "Seahorse meadow",
    area: "REEF",
    kind: "exhibit",
    points: main,
    tank: { box: [2.4, 1.3, 1.1] },
    equipment: pumpAnd(),
    series: [temperature(22.8, 0.3), salinity(34.6), ph(8.07), oxygen(7), pump, ammonia],
  },
  {
    code: "ELAS-01",
    name: "Ray and shark basin",
    area: "DEEP",
    kind: "exhibit",
    points: deep,
    tank: { round: [13.6, 2.9] },
    equipment: pumpAnd(["P2", "Circulation pump 2", "pump"], ["O1", "Ozone generator", "ozone-generator"]),
    series: [
      temperature(22.1, 0.4),
      salinity(34.3),
      ph(7.98),
      oxygen(7),
      oxygen(6.6, "BOTTOM"),
      orp(),
      pump,
      nitrate(24, 0.11),
    ],
  },
  {
    code: "ELAS-02",
    name: "Shark nursery",
    area: "DEEP",
    kind: "holding",
    points: main,
    tank: { round: [4.4, 1.2] },
    equipment: pumpAnd(),
    series: [temperature(21.9, 0.3), salinity(34.4), ph(8), oxygen(7.1), pump, ammonia, nitrate(17)],
  },
  {
    code: "COLD-01",
    name: "Cold-water coral",
    area: "DEEP",
    kind: "exhibit",
    points: main,
    tank: { box: [3.2, 1.9, 1.5] },
    equipment: pumpAnd(["C1", "Chiller 1", "chiller"]),
    series: [
      temperature(7.4, 0.1, true),
      salinity(34.8),
      ph(8.05),
      oxygen(9),
      pump,
      alkalinity(2.36),
      calcium,
    ],
  },
  {
    code: "COLD-02",
    name: "Deep crab tank",
    area: "DEEP",
    kind: "exhibit",
    points: main,
    tank: { box: [4, 2.2, 1.6] },
    equipment: pumpAnd(["C1", "Chiller 1", "chiller"]),
    series: [temperature(8.9, 0.1), salinity(34.6), ph(8.03), oxygen(8.7), pump, ammonia],
  },
  {
    code: "JELLY-01",
    name: "Moon jellies",
    area: "DRIFT",
    kind: "exhibit",
    points: main,
    tank: { round: [1.8, 0.95] },
    equipment: [["P1", "Circulation pump 1", "pump"]],
    series: [temperature(15.8, 0.2), salinity(33.6), ph(8.06), oxygen(7.5), pump, ammonia],
  },
  {
    code: "JELLY-02",
    name: "Compass jellies",
    area: "DRIFT",
    kind: "exhibit",
    points: main,
    tank: { round: [1.5, 0.9] },
    equipment: [["P1", "Circulation pump 1", "pump"]],
    series: [temperature(14.9, 0.2), salinity(33.8), ph(8.07), oxygen(7.6), pump],
  },
  {
    code: "LARV-01",
    name: "Larval rearing",
    area: "DRIFT",
    kind: "holding",
    points: [["SUMP", "Sump", "sump"]],
    tank: { box: [1.6, 0.8, 0.9] },
    equipment: [
      ["P1", "Circulation pump 1", "pump"],
      ["U1", "Ultraviolet steriliser", "uv"],
    ],
    series: [
      temperature(16.5, 0.1),
      salinity(34.5),
      ph(8.12),
      oxygen(7.6),
      pump,
      { ...ammonia, limits: { toleranceHigh: 0.0075 } },
    ],
  },
  {
    code: "RES-01",
    name: "Seawater reservoir",
    area: "QUAR",
    kind: "reservoir",
    points: main,
    tank: { round: [7.2, 3.7] },
    equipment: [["P1", "Transfer pump", "pump"]],
    series: [temperature(12.2, 1.8), salinity(34.7), ph(8.15), pump, alkalinity(2.48)],
  },
  {
    code: "QUAR-01",
    name: "Quarantine one",
    area: "QUAR",
    kind: "quarantine",
    points: main,
    tank: { round: [2.7, 0.9] },
    equipment: pumpAnd(),
    series: [
      temperature(24, 0.2),
      salinity(31.8, 32),
      ph(7.98),
      oxygen(6.9),
      pump,
      ammonia,
      {
        parameter: "copper",
        everyDays: 1,
        base: 168,
        noise: 9,
        limits: { target: 170, watchLow: 150, watchHigh: 190, toleranceLow: 130, toleranceHigh: 210 },
      },
    ],
  },
  {
    code: "QUAR-02",
    name: "Quarantine two",
    area: "QUAR",
    kind: "quarantine",
    points: main,
    tank: { round: [2.1, 0.9] },
    equipment: [["P1", "Circulation pump 1", "pump"]],
    series: [temperature(23.6, 0.2), salinity(34), ph(8.01), oxygen(6.9), pump],
  },
];
