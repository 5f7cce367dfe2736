/** Words and shapes of the systems module: no I/O, no framework; safe for the server, the client and files. */

export const SYSTEM_KINDS = ["exhibit", "holding", "quarantine", "reservoir", "mixing-tank"] as const;
export type SystemKind = (typeof SYSTEM_KINDS)[number];

export const WATER_TYPES = ["seawater", "brackish", "fresh"] as const;
export type WaterType = (typeof WATER_TYPES)[number];

export const SYSTEM_STATES = ["in-service", "out-of-service", "retired"] as const;
export type SystemState = (typeof SYSTEM_STATES)[number];

export const EQUIPMENT_KINDS = [
  "pump",
  "filter",
  "skimmer",
  "ozone-generator",
  "contact-chamber",
  "uv",
  "heater",
  "chiller",
  "sump",
  "biofilter",
  "degassing-tower",
  "aerator",
  "dosing-unit",
  "probe",
  "other",
] as const;
export type EquipmentKind = (typeof EQUIPMENT_KINDS)[number];

export const POINT_KINDS = [
  "surface",
  "mid-water",
  "bottom",
  "inlet",
  "outlet",
  "filter-outlet",
  "contact-chamber",
  "sump",
  "return-line",
  "other",
] as const;
export type PointKind = (typeof POINT_KINDS)[number];

/** 0 = no restriction beyond clean hands; 4 = strict isolation. The facility writes what each level asks for. */
export const BIOSECURITY_LEVELS = [0, 1, 2, 3, 4] as const;
export type BiosecurityLevel = (typeof BIOSECURITY_LEVELS)[number];

/** A quantity with its standard uncertainty (one standard deviation, GUM 2.3.1) in the same unit. */
export type Measured = { value: number; standardUncertainty: number };

export const SHAPES = [
  "box",
  "upright-cylinder",
  "lying-cylinder",
  "cone",
  "frustum",
  "spherical-cap",
  "upright-elliptic",
  "lying-elliptic",
  "pipe-run",
  "free-litres",
] as const;
export type Shape = (typeof SHAPES)[number];

/** Inner dimensions in metres of each shape, as `[input name]: Measured`. `free-litres` holds litres. */
export type ShapeDimensions =
  | { shape: "box"; lengthM: Measured; widthM: Measured; heightM: Measured }
  | { shape: "upright-cylinder"; diameterM: Measured; heightM: Measured }
  | { shape: "lying-cylinder"; diameterM: Measured; lengthM: Measured }
  /** `down`: the tip is the lowest place (a conical bottom); `up`: the tip is the highest. */
  | { shape: "cone"; tip: "down" | "up"; diameterM: Measured; heightM: Measured }
  | { shape: "frustum"; bottomDiameterM: Measured; topDiameterM: Measured; heightM: Measured }
  /** `down`: a dished bottom, rim on top; `up`: a dome, rim below. */
  | { shape: "spherical-cap"; crown: "down" | "up"; rimDiameterM: Measured; heightM: Measured }
  | { shape: "upright-elliptic"; longDiameterM: Measured; shortDiameterM: Measured; heightM: Measured }
  /** `widthM` is the level axis of the ellipse, `heightM` the plumb one. */
  | { shape: "lying-elliptic"; widthM: Measured; heightM: Measured; lengthM: Measured }
  | { shape: "pipe-run"; innerDiameterM: Measured; lengthM: Measured }
  | { shape: "free-litres"; volumeL: Measured };

/** One piece of a system's geometry. */
export type VolumeComponent = ShapeDimensions & {
  name: string;
  /** Depth of water above the lowest place inside; null when the piece is full. Free litres have none. */
  fillDepthM: Measured | null;
  /** Litres taken up by rockwork, columns, pipes; null when there is nothing in the water. */
  displacementL: Measured | null;
  /** True where the system's own water level stands in this piece, so that a change of level changes its volume. */
  isAtSurface: boolean;
};

/** The part that one input plays in a combined uncertainty: |sensitivity| × its standard uncertainty, litres. */
export type UncertaintyShare = { input: string; contributionL: number };

export type ComponentVolume = {
  name: string;
  /** Water and rockwork together, litres. */
  grossL: number;
  displacementL: number;
  /** Water alone, litres. */
  volumeL: number;
  standardUncertaintyL: number;
  /** Area of the water surface, square metres; 0 where a level has no meaning (free litres, a full closed pipe). */
  surfaceAreaM2: number;
  shares: UncertaintyShare[];
};

export type TotalVolume = {
  volumeL: number;
  standardUncertaintyL: number;
  /** Coverage factor 2: an interval with a level of confidence of about 95 % (GUM 6.2). */
  expandedUncertaintyL: number;
  /** Summed surface of the components that stand at the system's water level. */
  surfaceAreaM2: number;
  components: ComponentVolume[];
};

export const DETERMINATION_METHODS = ["geometry", "tracer"] as const;
export type DeterminationMethod = (typeof DETERMINATION_METHODS)[number];

export const DETERMINATION_STATUSES = ["proposed", "approved", "declined"] as const;
export type DeterminationStatus = (typeof DETERMINATION_STATUSES)[number];
