/** Words and shapes of the systems module: no I/O, no framework; safe for the server, the client and files. */

export {
  EQUIPMENT_KIND_WORDS,
  POINT_KIND_WORDS,
  SYSTEM_KIND_WORDS,
  SYSTEM_STATE_WORDS,
  WATER_TYPE_WORDS,
} from "./words.data";

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

/** Units in which the lengths and volumes of a component may be typed; the canonical ones come first. */
export const LENGTH_UNITS = ["m", "cm", "mm", "ft", "in"] as const;
export type LengthUnit = (typeof LENGTH_UNITS)[number];
export const VOLUME_UNITS = ["L", "m³", "US gal", "imp gal"] as const;
export type VolumeUnit = (typeof VOLUME_UNITS)[number];

/** A quantity as it was typed, with its standard uncertainty in the same unit; an empty uncertainty is 0. */
export type TypedQuantity = { text: string; uncertainty: string };

/** A component as a person typed it; kept beside the canonical one. */
export type TypedComponent = {
  name: string;
  shape: Shape;
  /** Where the tip of a cone or the crown of a cap is; without meaning for other shapes. */
  pointing: "up" | "down";
  lengthUnit: LengthUnit;
  volumeUnit: VolumeUnit;
  /** By input name (see SHAPE_INPUTS); all in `lengthUnit`, but the litres of `free-litres` in `volumeUnit`. */
  dimensions: Record<string, TypedQuantity>;
  fillDepth: TypedQuantity | null;
  displacement: TypedQuantity | null;
  isAtSurface: boolean;
};

export const DETERMINATION_METHODS = ["geometry", "tracer"] as const;
export type DeterminationMethod = (typeof DETERMINATION_METHODS)[number];

export const DETERMINATION_STATUSES = ["proposed", "approved", "declined"] as const;
export type DeterminationStatus = (typeof DETERMINATION_STATUSES)[number];

export type SiteRow = { id: number; code: string; name: string };

export type AreaRow = {
  id: number;
  siteId: number;
  code: string;
  name: string;
  biosecurityLevel: number;
  walkingOrder: number;
  systemCount: number;
};

export type SystemRow = {
  id: number;
  code: string;
  name: string;
  kind: SystemKind;
  waterType: WaterType;
  state: SystemState;
  walkingOrder: number;
  areaId: number;
  areaCode: string;
  areaName: string;
  biosecurityLevel: number;
  notes: string;
  /** The volume of record, litres; null where none has been approved yet. */
  volumeL: number | null;
};

export type PointRow = {
  id: number;
  code: string;
  name: string;
  kind: PointKind;
  isDefault: boolean;
  isInUse: boolean;
  systemId: number;
  systemCode: string;
  systemName: string;
  systemState: SystemState;
  areaId: number;
  areaCode: string;
};

export type EquipmentRow = {
  id: number;
  systemId: number;
  systemCode: string;
  code: string;
  name: string;
  kind: EquipmentKind;
  state: SystemState;
  notes: string;
};

export type SystemDetail = SystemRow & {
  points: PointRow[];
  equipment: EquipmentRow[];
  retiredAt: number | null;
  retiredReason: string | null;
};

/** What a determination keeps of its geometry: as typed, and as computed on that day. */
export type GeometrySnapshot = { typed: TypedComponent[]; computed: ComponentVolume[] };

export type DeterminationRow = {
  id: number;
  systemId: number;
  systemCode: string;
  method: DeterminationMethod;
  volumeL: number;
  standardUncertaintyL: number;
  surfaceAreaM2: number | null;
  correlation: number;
  geometry: GeometrySnapshot | null;
  note: string;
  status: DeterminationStatus;
  proposedById: number;
  proposedBy: string;
  proposedAt: number;
  effectiveFromAt: number;
  decidedBy: string | null;
  decidedAt: number | null;
  decisionReason: string | null;
  /** True for the one that is the volume of record at the moment asked about. */
  isOfRecord: boolean;
  /** How it contradicts the volume of record, as a sentence; null where it does not. */
  disagreement: string | null;
};

export type OperatingLevelRow = {
  levelOffsetM: number;
  levelOffsetUncertaintyM: number;
  isDrained: boolean;
  reason: string;
  setBy: string | null;
  setAt: number;
};

export type VolumeSheet = {
  system: SystemRow;
  record: DeterminationRow | null;
  level: OperatingLevelRow | null;
  /** What the system holds today, litres; null with a sentence that says why where it cannot be told. */
  operating: Measured | null;
  operatingSays: string | null;
  /** The other systems that share this water, those the reader may see. */
  joinedWith: { id: number; code: string; name: string; operating: Measured | null }[];
  /** Joined systems in areas the reader may not see. */
  joinedElsewhere: number;
  /** What the whole joined body of water holds; null when not joined or when a part cannot be told. */
  joinedTotal: Measured | null;
  determinations: DeterminationRow[];
};
