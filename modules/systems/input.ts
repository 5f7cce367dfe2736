import { z } from "zod";
import { wholeNumber } from "@/lib/whole-number";
import {
  EQUIPMENT_KINDS,
  LENGTH_UNITS,
  POINT_KINDS,
  SHAPES,
  SYSTEM_KINDS,
  SYSTEM_STATES,
  VOLUME_UNITS,
  WATER_TYPES,
} from "./model";
import { componentProblems, readDecimal } from "./rules/typed-component";
import { SHAPE_TABLE } from "./shapes.data";

const id = wholeNumber(1, Number.MAX_SAFE_INTEGER, "Choose one from the list.");
const code = z
  .string("Give a code, such as KELP-01.")
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9][A-Z0-9-]{0,19}$/, "Use 1 to 20 letters, figures and hyphens, such as KELP-01.");
const name = z
  .string("Write a name.")
  .trim()
  .min(1, "Write a name.")
  .max(80, "Keep the name under 80 characters.");
const order = wholeNumber(0, 9999, "The walking order is a whole number from 0 to 9999.");
const notes = z.string().trim().max(2000, "Keep notes under 2,000 characters.").default("");
const reason = z
  .string("Say why, in a few words.")
  .trim()
  .min(3, "Say why, in a few words.")
  .max(500, "Keep the reason under 500 characters.");
const moment = z.number().int().min(0).max(8.64e15).nullable().default(null);

/** True or false, also as an address carries it (“true”, “0”). */
const flag = z.union([z.boolean(), z.stringbool()]);

export const createSiteInput = z.strictObject({ code, name });

const areaFields = {
  code,
  name,
  biosecurityLevel: wholeNumber(0, 4, "The biosecurity level is a whole number from 0 to 4."),
  walkingOrder: order,
};
/** What a form asks about an area, a system, a point, equipment; new and existing alike. */
export const areaFormInput = z.strictObject(areaFields);
/** Without a site, the only one there is. */
export const createAreaInput = z.strictObject({ ...areaFields, siteId: id.nullable().default(null) });
export const editAreaInput = z.strictObject({ ...areaFields, areaId: id });

const pointFields = { code, name, kind: z.enum(POINT_KINDS, "Choose what kind of point it is.") };
const systemFields = {
  code,
  name,
  areaId: id,
  kind: z.enum(SYSTEM_KINDS, "Choose what kind of system it is."),
  waterType: z.enum(WATER_TYPES, "Choose the type of water."),
  walkingOrder: order,
  notes,
};
const workingState = z.enum(["in-service", "out-of-service"], "To retire a system, use “Retire”.");
export const systemFormInput = z.strictObject({ ...systemFields, state: workingState });
export const createSystemInput = z.strictObject({
  ...systemFields,
  state: workingState.default("in-service"),
  /** The point that readings are taken at unless another is named. */
  defaultPoint: z.strictObject(pointFields).default({ code: "SURFACE", name: "Surface", kind: "surface" }),
});
export const editSystemInput = z.strictObject({
  ...systemFields,
  systemId: id,
  state: workingState,
});
export const reasonFormInput = z.strictObject({ reason });
export const retireSystemInput = z.strictObject({ systemId: id, reason });

export const pointFormInput = z.strictObject({
  ...pointFields,
  isDefault: z.boolean(),
  isInUse: z.boolean(),
});
export const addPointInput = z.strictObject({
  ...pointFields,
  systemId: id,
  isDefault: z.boolean().default(false),
});
export const editPointInput = z.strictObject({
  ...pointFields,
  pointId: id,
  isDefault: z.boolean(),
  isInUse: z.boolean(),
});

const equipmentFields = {
  code,
  name,
  kind: z.enum(EQUIPMENT_KINDS, "Choose what kind of equipment it is."),
  state: z.enum(SYSTEM_STATES).default("in-service"),
  notes,
};
export const equipmentFormInput = z.strictObject(equipmentFields);
export const addEquipmentInput = z.strictObject({ ...equipmentFields, systemId: id });
export const editEquipmentInput = z.strictObject({ ...equipmentFields, equipmentId: id });

const quantity = z.strictObject({
  text: z.string().trim().max(40, "This is too long for a number."),
  uncertainty: z.string().trim().max(40, "This is too long for a number.").default(""),
});
const lengthUnit = z.enum(LENGTH_UNITS);
const volumeUnit = z.enum(VOLUME_UNITS);

/** One component as typed: what cannot be read, or makes no tank, is told under the field it stands in. */
export const typedComponentInput = z
  .strictObject({
    name: z.string().trim().min(1, "Name this component.").max(80, "Keep the name under 80 characters."),
    shape: z.enum(SHAPES, "Choose a shape."),
    pointing: z.enum(["up", "down"]).default("down"),
    lengthUnit: lengthUnit.default("m"),
    volumeUnit: volumeUnit.default("L"),
    dimensions: z.record(z.string().max(40), quantity),
    fillDepth: quantity.nullable().default(null),
    displacement: quantity.nullable().default(null),
    isAtSurface: z.boolean().default(false),
  })
  .superRefine((typed, context) => {
    const known = new Set(SHAPE_TABLE[typed.shape].inputs.map((input) => input.name));
    for (const key of Object.keys(typed.dimensions).filter((given) => !known.has(given))) {
      const message = `A ${SHAPE_TABLE[typed.shape].label.toLowerCase()} has no such dimension.`;
      context.addIssue({ code: "custom", path: ["dimensions", key], message });
    }
    for (const { path, message } of componentProblems(typed)) {
      context.addIssue({ code: "custom", path, message });
    }
  });

const decimal = (mayBeNegative: boolean, what: string) =>
  quantity.superRefine((typed, context) => {
    const value = readDecimal(typed.text);
    if (value === null || (!mayBeNegative && value <= 0)) {
      context.addIssue({
        code: "custom",
        path: ["text"],
        message: `${what} must be a number${mayBeNegative ? "" : " above 0"}.`,
      });
    }
    const uncertainty = typed.uncertainty === "" ? 0 : readDecimal(typed.uncertainty);
    if (uncertainty === null || uncertainty < 0) {
      const message = "The standard uncertainty must be a number of 0 or more.";
      context.addIssue({ code: "custom", path: ["uncertainty"], message });
    }
  });

const proposal = {
  systemId: id,
  note: z.string().trim().max(1000, "Keep the note under 1,000 characters.").default(""),
  /** From when it counts, once approved; null for the moment of the proposal. */
  effectiveFromAt: moment,
};
export const proposeVolumeInput = z.discriminatedUnion("method", [
  z.strictObject({
    ...proposal,
    method: z.literal("geometry"),
    components: z
      .array(typedComponentInput)
      .min(1, "Add at least one component.")
      .max(100, "Keep to 100 components; sum up small ones as a known volume."),
    /** One coefficient between all components: 0 measured apart, 1 all with the same tape. */
    correlation: z
      .number()
      .min(0, "The correlation lies between 0 and 1.")
      .max(1, "The correlation lies between 0 and 1.")
      .default(0),
  }),
  z.strictObject({
    ...proposal,
    method: z.literal("tracer"),
    volume: decimal(false, "The volume"),
    volumeUnit: volumeUnit.default("L"),
    /** Square metres of open water, for changes of level; null when it is not known. */
    surfaceArea: decimal(false, "The area of the surface").nullable().default(null),
    note: z
      .string()
      .trim()
      .min(3, "Say what was added, how much, and what it rose to.")
      .max(1000, "Keep the note under 1,000 characters."),
  }),
]);

const approvalFields = {
  reason: z.string().trim().max(500, "Keep the remark under 500 characters.").default(""),
  /** True after a person has been shown that the new volume contradicts the volume of record. */
  acceptsDisagreement: z.boolean().default(false),
};
export const approvalFormInput = z.strictObject(approvalFields);
export const approveVolumeInput = z.strictObject({ ...approvalFields, determinationId: id });
export const declineVolumeInput = z.strictObject({ determinationId: id, reason });

const levelFields = {
  /** Height of the water above (+) or below (−) the level of the volume of record. */
  levelOffset: decimal(true, "The level"),
  lengthUnit: lengthUnit.default("cm"),
  isDrained: z.boolean().default(false),
  /** All systems that this one shares its water with; who is left out is parted. */
  joinedWith: z.array(id).max(50).default([]),
  reason,
};
export const levelFormInput = z.strictObject(levelFields);
export const setOperatingLevelInput = z.strictObject({ ...levelFields, systemId: id });

export const listAreasInput = z.strictObject({});
export const listSystemsInput = z.strictObject({
  areaId: id.optional(),
  kind: z.enum(SYSTEM_KINDS).optional(),
  includeRetired: flag.default(false),
});
export const systemByCodeInput = z.strictObject({ code });
export const listPointsInput = z.strictObject({
  systemId: id.optional(),
  includeRetired: flag.default(false),
});
export const listEquipmentInput = z.strictObject({ systemId: id.optional() });
export const volumeOfInput = z.strictObject({
  code,
  at: wholeNumber(0, 8.64e15, "Give the moment in milliseconds since 1970.").optional(),
});
export const listWaitingVolumesInput = z.strictObject({});
