import { z } from "zod";
import { wholeNumber } from "@/lib/whole-number";
import {
  ANSWER_MEANINGS,
  CHECK_VERDICTS,
  INSTRUMENT_STATES,
  PARAMETER_GROUPS,
  PARAMETER_KINDS,
} from "./model";
import { definitionFaults } from "./rules/definition-faults";

/** A number or nothing, as such or as typed: comma or point, any minus sign; an empty text is nothing. */
const decimalOrNothing = z
  .union([z.number(), z.string().trim(), z.null()], "Write a number, or leave it empty.")
  .transform((given, context) => {
    if (given === null || given === "") return null;
    const value =
      typeof given === "number"
        ? given
        : /^[+\-−–]?(\d+([.,]\d*)?|[.,]\d+)$/.test(given)
          ? Number(given.replace(/[−–]/, "-").replace(",", "."))
          : Number.NaN;
    if (Number.isFinite(value)) return value;
    context.addIssue({ code: "custom", message: "Write a number, such as 34.5, or leave it empty." });
    return z.NEVER;
  });

const id = wholeNumber(1, Number.MAX_SAFE_INTEGER, "Choose one from the list.");
const idOrNothing = z.union([z.literal("").transform(() => null), z.null(), id]).default(null);
const name = z.string().trim().min(1, "Write a name.").max(80, "Keep the name under 80 characters.");
const note = z.string().trim().max(1000, "Keep the note under 1,000 characters.").default("");
const reason = z
  .string()
  .trim()
  .min(3, "Say why, in a few words.")
  .max(500, "Keep the reason under 500 characters.");
const tag = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9][A-Z0-9-]{0,19}$/, "Use 1 to 20 letters, figures and hyphens, such as REF-02.");
const textOrNothing = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `Keep it under ${max} characters.`)
    .nullable()
    .default(null)
    .transform((text) => (text === "" ? null : text));

const parameterCode = z
  .string()
  .trim()
  .toLowerCase()
  .regex(
    /^[a-z][a-z0-9_]{0,39}$/,
    "Begin with a letter, then letters, figures and underlines, such as nitrate_n.",
  );
const unitCode = textOrNothing(40);
const choice = z.strictObject({
  code: z
    .string()
    .trim()
    .toLowerCase()
    .regex(/^[a-z0-9][a-z0-9_-]{0,39}$/, "Use small letters, figures and hyphens, such as slightly-cloudy."),
  label: z.string().trim().min(1, "Write the answer as it is shown.").max(60, "Keep it under 60 characters."),
  means: z.enum(ANSWER_MEANINGS, "Choose what this answer means."),
});

const changeable = {
  name,
  acceptedUnits: z.array(z.string().max(40)).max(40).default([]),
  decimals: wholeNumber(0, 6, "Decimals are a whole number from 0 to 6."),
  plausible: z
    .strictObject({ low: decimalOrNothing, high: decimalOrNothing })
    .default({ low: null, high: null }),
  choices: z.array(choice).max(40, "Keep to 40 answers.").default([]),
  group: z.enum(PARAMETER_GROUPS, "Choose a group."),
  mayBeNegative: z.boolean().default(false),
  note,
};

type Fields = Parameters<typeof definitionFaults>[0];

/** Every fault of the definition under the field in which it lies. */
function checkDefinition(value: Fields, context: z.RefinementCtx): void {
  for (const { path, sentence } of definitionFaults(value)) {
    context.addIssue({ code: "custom", path: [...path], message: sentence });
  }
}

export const createParameterInput = z
  .strictObject({
    ...changeable,
    code: parameterCode,
    kind: z.enum(PARAMETER_KINDS, "Choose what its value is made of."),
    unit: unitCode,
  })
  .superRefine(checkDefinition);

/** Code, kind and unit may be sent along, and must then be what they are: they never change. */
export const editParameterInput = z.strictObject({
  ...changeable,
  parameterId: id,
  code: parameterCode.optional(),
  kind: z.enum(PARAMETER_KINDS).optional(),
  unit: unitCode.optional(),
});

export const reasonFormInput = z.strictObject({ reason });
export const retireParameterInput = z.strictObject({ parameterId: id, reason });

/** Without codes: every entry that is not there yet. */
export const addCatalogueInput = z.strictObject({ codes: z.array(parameterCode).max(200).optional() });

const methodFields = {
  name,
  principle: z.string().trim().min(2, "Say how it measures.").max(500, "Keep it under 500 characters."),
};
export const createMethodInput = z.strictObject({ ...methodFields, code: tag, parameterId: id });
export const editMethodInput = z.strictObject({
  ...methodFields,
  methodId: id,
  isRetired: z.boolean().default(false),
});

const instrumentFields = {
  name,
  serial: z.string().trim().min(1, "Write the serial number.").max(80, "Keep it under 80 characters."),
  principle: z.string().trim().min(2, "Say how it measures.").max(200, "Keep it under 200 characters."),
  /** What its marks mean (a refractometer: seawater or brine). */
  scale: textOrNothing(80),
  checkEveryDays: z
    .union([
      z.literal("").transform(() => null),
      z.null(),
      wholeNumber(1, 3660, "Days between checks are a whole number from 1 to 3660; leave it empty for none."),
    ])
    .default(null),
};
export const createInstrumentInput = z.strictObject({
  ...instrumentFields,
  code: tag,
  state: z.enum(["in-use", "out-of-use"]).default("in-use"),
});
export const editInstrumentInput = z.strictObject({
  ...instrumentFields,
  instrumentId: id,
  state: z.enum(INSTRUMENT_STATES, "Choose a state."),
  /** Needed to retire it. */
  retiredReason: textOrNothing(500),
});

export const recordInstrumentCheckInput = z.strictObject({
  instrumentId: id,
  parameterId: idOrNothing,
  /** UTC epoch ms; now where it is left out. */
  checkedAt: z.number().int().min(0).max(8.64e15).nullable().default(null),
  standard: z
    .string()
    .trim()
    .min(2, "Say against what it was checked, with its lot or certificate.")
    .max(200, "Keep it under 200 characters."),
  standardValue: decimalOrNothing.default(null),
  asFound: decimalOrNothing.default(null),
  asLeft: decimalOrNothing.default(null),
  unit: unitCode,
  verdict: z.enum(CHECK_VERDICTS, "Say what the check found."),
  note,
});

const flag = z.union([z.boolean(), z.stringbool()]);
export const listParametersInput = z.strictObject({ includeRetired: flag.default(false) });
export const listMethodsInput = z.strictObject({
  parameterId: id.optional(),
  includeRetired: flag.default(false),
});
export const listInstrumentsInput = z.strictObject({ includeRetired: flag.default(false) });
export const instrumentByCodeInput = z.strictObject({ code: tag });
