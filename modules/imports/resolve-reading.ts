import { Problem } from "@/lib/problem";
import { CLOCK_SLACK_MS, type OfferedReading, readTypedValue } from "@/modules/measurements";
import type { FacilityParameter } from "@/modules/methods/model";
import type { Directory, Place } from "./directory";
import type {
  CandidateReading,
  ImportField,
  MappedColumn,
  ResolvedReading,
  ResolveProblemCode,
  StagedProblem,
} from "./model";
import { plainValueText } from "./rules/value-text";

export type Resolved =
  | { kind: "found"; reading: ResolvedReading; offered: OfferedReading }
  | { kind: "refused"; problems: StagedProblem[] };

export type ResolveContext = {
  directory: Directory;
  columns: readonly MappedColumn[];
  /** Now, UTC epoch ms: nothing is read ahead of it. */
  at: number;
};

type Fault = {
  field: ImportField;
  code: ResolveProblemCode;
  reason: string;
  mend: string;
  text: string | null;
};
const LONGEST = { note: 1000, value: 2000, unit: 40 } as const;

/** Looks up what a reading of a file names. All problems at once, each with its column, the reason and how to mend it. */
export function resolveReading(candidate: CandidateReading, context: ResolveContext): Resolved {
  const faults: Fault[] = [];
  const place = findPlace(candidate, context.directory, faults);
  const parameter = findParameter(candidate, context.directory, faults);
  const methodId = findMethod(candidate, parameter, context.directory, faults);
  const instrumentId = findInstrument(candidate, context.directory, faults);
  const takenBy = findPerson(candidate, context.directory, faults);
  if (candidate.takenAt > context.at + CLOCK_SLACK_MS) faults.push(future(candidate));
  checkLengths(candidate, faults);
  const plainText = plainValueText(candidate.value);
  const typed = { typedText: candidate.valueText, plainText, typedUnit: candidate.unit };
  const value = parameter && readValue(parameter, typed, faults);
  if (faults.length > 0 || !place || !parameter || !value) {
    return {
      kind: "refused",
      problems: faults.map((fault) => withColumn(fault, candidate, context.columns)),
    };
  }
  const where = { pointId: place.pointId, parameterId: parameter.id, takenAt: candidate.takenAt };
  const reading = { ...where, ...typed, takenBy, methodId, instrumentId, note: candidate.note };
  return { kind: "found", reading, offered: { ...where, ...value } };
}

function withColumn(
  { field, ...fault }: Fault,
  candidate: CandidateReading,
  columns: readonly MappedColumn[],
): StagedProblem {
  const isOfValue = field === "value" || field === "parameter" || field === "unit";
  const own = columns.find(({ use }) => use.kind === "field" && use.field === field);
  const date = columns.find(({ use }) => use.kind === "field" && use.field === "date");
  const column = own ?? (isOfValue ? columns[candidate.column] : field === "moment" ? date : undefined);
  return { columnName: column?.header ?? null, ...fault };
}

function findPlace(candidate: CandidateReading, { systems }: Directory, faults: Fault[]): Place | null {
  const name = candidate.system ?? "";
  const found = systems.find(name);
  const [system] = found;
  const fault = (code: ResolveProblemCode, reason: string, mend: string) => {
    faults.push({ field: "system", code, reason, mend, text: name });
    return null;
  };
  if (!system || found.length > 1) {
    const example = systems.all[0]?.code ?? "KELP-01";
    const reason = system
      ? `“${name}” is the name of ${found.length} systems.`
      : `There is no system “${name}”.`;
    return fault("unknown-system", reason, `Write the system's code, such as ${example}.`);
  }
  if (!system.mayHere) {
    return fault(
      "other-area",
      `${system.code} is in ${system.areaName}, which is not one of your areas.`,
      "Have it imported by somebody who may bring in readings there, or take the row out.",
    );
  }
  if (system.state === "retired") {
    return fault("retired-system", `${system.code} is retired; nothing is read there.`, "Take the row out.");
  }
  return findPoint(candidate.point, system.code, system.points, faults);
}

function findPoint(name: string | null, systemCode: string, points: Place[], faults: Fault[]): Place | null {
  const wanted = name?.trim().toLowerCase() ?? "";
  const place =
    wanted === ""
      ? points.find((each) => each.isDefaultPoint)
      : points.find((each) => [each.pointCode, each.pointName].some((word) => word.toLowerCase() === wanted));
  if (place?.isPointInUse) return place;
  const inUse = points.filter((each) => each.isPointInUse).map((each) => each.pointCode);
  faults.push({
    field: "point",
    code: place ? "unused-point" : "unknown-point",
    reason: place
      ? `The point ${place.pointName} of ${systemCode} is no longer in use.`
      : `${systemCode} has no point “${name ?? ""}”.`,
    mend: `Write one of its points: ${inUse.join(", ")}. Left empty, the default point is meant.`,
    text: name,
  });
  return null;
}

function findParameter(
  { parameter: name }: CandidateReading,
  { parameters }: Directory,
  faults: Fault[],
): FacilityParameter | null {
  const found = parameters.find(name);
  const [parameter] = found;
  if (parameter && found.length === 1 && !parameter.isRetired) return parameter;
  const isRetired = parameter?.isRetired ?? false;
  faults.push({
    field: "parameter",
    code: isRetired ? "retired-parameter" : "unknown-parameter",
    reason: isRetired
      ? `${parameter?.name} is not measured any more.`
      : parameter
        ? `“${name}” is the name of ${found.length} parameters.`
        : `There is no parameter “${name}”.`,
    mend: "Write the parameter's code or name as it stands under Setup, Parameters.",
    text: name,
  });
  return null;
}

function findMethod(
  { method: name }: CandidateReading,
  parameter: FacilityParameter | null,
  { methods }: Directory,
  faults: Fault[],
): number | null {
  if (name === null) return null;
  const found = methods.find(name);
  const fitting = parameter ? found.find((each) => each.parameterId === parameter.id) : found[0];
  if (fitting) return fitting.id;
  faults.push({
    field: "method",
    code: "unknown-method",
    reason:
      found.length > 0 ? `${name} is not a method for ${parameter?.name}.` : `There is no method “${name}”.`,
    mend: "Write the method's code as it stands under Setup, or leave the cell empty.",
    text: name,
  });
  return null;
}

function findInstrument(
  { instrument: name }: CandidateReading,
  { instruments }: Directory,
  faults: Fault[],
): number | null {
  if (name === null) return null;
  const found = instruments.find(name);
  if (found[0] && found.length === 1) return found[0].id;
  faults.push({
    field: "instrument",
    code: "unknown-instrument",
    reason:
      found.length > 1
        ? `“${name}” stands for ${found.length} instruments.`
        : `There is no instrument “${name}”.`,
    mend: "Write the instrument's code or serial number as it stands under Setup, or leave the cell empty.",
    text: name,
  });
  return null;
}

function findPerson(
  { takenBy: name }: CandidateReading,
  { people }: Directory,
  faults: Fault[],
): number | null {
  if (name === null) return null;
  const found = people.find(name);
  if (found[0] && found.length === 1) return found[0].id;
  faults.push({
    field: "takenBy",
    code: "unknown-person",
    reason:
      found.length > 1
        ? `${found.length} people are called “${name}”.`
        : `There is nobody here called “${name}”.`,
    mend: "Write the full name of somebody who works here, or leave the cell empty: then it is you.",
    text: name,
  });
  return null;
}

const future = (candidate: CandidateReading): Fault => ({
  field: "moment",
  code: "future",
  reason: "The time lies in the future.",
  mend: "Say when the reading was taken; check the order of day and month.",
  text: candidate.takenAtText,
});

function checkLengths(candidate: CandidateReading, faults: Fault[]): void {
  const texts = { note: candidate.note, value: candidate.valueText, unit: candidate.unit };
  for (const field of ["note", "value", "unit"] as const) {
    const { length } = texts[field] ?? "";
    if (length <= LONGEST[field]) continue;
    faults.push({
      field,
      code: "too-long",
      reason: `The ${field} has ${length} characters.`,
      mend: `Shorten it to at most ${LONGEST[field]} characters.`,
      text: `${(texts[field] ?? "").slice(0, 80)}…`,
    });
  }
}

type Typed = { typedText: string; plainText: string; typedUnit: string | null };

function readValue(parameter: FacilityParameter, typed: Typed, faults: Fault[]) {
  try {
    return readTypedValue(parameter, typed, "");
  } catch (cause) {
    if (!(cause instanceof Problem)) throw cause;
    const isUnit = cause.errors[0]?.pointer === "/typedUnit";
    const [reason = cause.message, ...rest] = cause.message.split(/(?<=[.]) (?=[A-Z])/);
    faults.push({
      field: isUnit ? "unit" : "value",
      code: isUnit ? "bad-unit" : "bad-value",
      reason,
      mend: rest.join(" ") || "Correct the cell.",
      text: isUnit ? typed.typedUnit : typed.typedText,
    });
    return null;
  }
}
