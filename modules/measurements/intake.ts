import type { Orm } from "@/db/database";
import { MINUTE_MS } from "@/lib/clock";
import { invalidField, Problem } from "@/lib/problem";
import { UnitError } from "@/lib/units/factors";
import { toCanonical } from "@/modules/methods";
import type { FacilityParameter } from "@/modules/methods/model";
import type { DeliveredReading } from "./input";
import { IntakeCache } from "./intake-cache";
import { judgeAndStore, judgeDependents } from "./judge";
import type { JudgementCause, ReadingSource, ReadingValue, StatusVerdict } from "./model";
import { parseValue } from "./rules/parse-value";
import type { reading } from "./schema";
import { askingStatements, writingStatements } from "./statements";

/** Clocks of tablets run a little ahead; more than this lies in the future. */
export const CLOCK_SLACK_MS = 5 * MINUTE_MS;

type ReadingRow = typeof reading.$inferSelect;

/**
 * What was typed, brought to the canonical unit. `plainText` says the same with a decimal point, where what was typed
 * follows the conventions of a file ("1,234" in a file with decimal commas).
 * @throws Problem `invalid` at `pointer`
 */
export function readTypedValue(
  parameter: FacilityParameter,
  typed: { typedText: string; typedUnit?: string | null | undefined; plainText?: string | null | undefined },
  pointer: string,
): { value: number | null; qualifier: ReadingValue["qualifier"]; answer: string | null } {
  const shape = { kind: parameter.kind, choices: parameter.choices };
  const parsed = typed.plainText
    ? parseValue(typed.plainText, shape, ".")
    : parseValue(typed.typedText, shape);
  if (!parsed.ok) throw invalidField(`${pointer}/typedText`, parsed.code, parsed.sentence);
  const isAnswer = parameter.kind === "choice" || parameter.kind === "text" || parameter.kind === "yes-no";
  if (isAnswer) return { value: parsed.value, qualifier: parsed.qualifier, answer: parsed.text };
  if (parsed.value === null) return { value: null, qualifier: parsed.qualifier, answer: null };
  try {
    const value = toCanonical(parsed.value, typed.typedUnit ?? parameter.unit, parameter);
    return { value, qualifier: parsed.qualifier, answer: null };
  } catch (cause) {
    if (cause instanceof UnitError || cause instanceof RangeError) {
      throw invalidField(`${pointer}/typedUnit`, "unit", cause.message);
    }
    throw cause;
  }
}

function mustNotLieAhead(takenAt: number, at: number, pointer: string): void {
  if (takenAt <= at + CLOCK_SLACK_MS) return;
  throw invalidField(
    `${pointer}/takenAt`,
    "future",
    "The time lies in the future. Say when the reading was taken.",
  );
}

function whoTook(
  cache: IntakeCache,
  given: number | null | undefined,
  enteredBy: number,
  pointer: string,
): number {
  if (given === null || given === undefined || given === enteredBy) return enteredBy;
  if (!cache.isActivePerson(given)) {
    throw invalidField(`${pointer}/takenBy`, "unknown-person", "There is no such person here any more.");
  }
  return given;
}

export type Intake = {
  db: Orm;
  at: number;
  enteredBy: number;
  source: ReadingSource;
  sourceRef?: string | null;
  /** A bulk that is not visible yet: nothing that counts depends on its readings; publishing judges again what will. */
  deliveryId?: number | null;
  /** Looked up once for all readings of one transaction. */
  cache?: IntakeCache;
};

export type Taken = { row: ReadingRow; verdict: StatusVerdict | null; isRepeat: boolean };

function repeated(intake: Intake, input: DeliveredReading, pointer: string): Taken | null {
  const known = askingStatements(intake.db).byUuid.get({ uuid: input.uuid });
  if (!known) return null;
  const isSame =
    known.enteredBy === intake.enteredBy &&
    known.pointId === input.pointId &&
    known.parameterId === input.parameterId &&
    known.typedText === input.typedText &&
    known.takenAt === input.takenAt;
  if (!isSame)
    throw invalidField(
      `${pointer}/uuid`,
      "uuid-reused",
      "This UUID belongs to another reading; make a new one.",
    );
  return { row: known, verdict: null, isRepeat: true };
}

/**
 * Stores one reading and judges it; a reading is stored always, whatever its status. The same UUID with the same content is
 * answered with the first; late readings judge again what they change.
 * @throws Problem `invalid` with pointers below `pointer`, `not-found`
 */
export function takeReading(intake: Intake, input: DeliveredReading, pointer = ""): Taken {
  const { db, at, enteredBy, cache = new IntakeCache(db) } = intake;
  const repeat = repeated(intake, input, pointer);
  if (repeat) return repeat;
  const place = cache.place(input.pointId);
  if (place.systemState === "retired")
    throw new Problem("conflict", `${place.systemCode} is retired; nothing is read there.`);
  const parameter = cache.parameter(input.parameterId);
  if (parameter.isRetired)
    throw invalidField(`${pointer}/parameterId`, "retired", `${parameter.name} is not measured any more.`);
  mustNotLieAhead(input.takenAt, at, pointer);
  const typed = readTypedValue(parameter, input, pointer);
  const row = writingStatements(db).store.get({
    uuid: input.uuid,
    pointId: input.pointId,
    parameterId: input.parameterId,
    typedText: input.typedText,
    typedUnit: input.typedUnit ?? parameter.unit,
    ...typed,
    takenAt: input.takenAt,
    enteredAt: at,
    takenBy: whoTook(cache, input.takenBy, enteredBy, pointer),
    enteredBy,
    methodId: input.methodId ?? null,
    instrumentId: input.instrumentId ?? null,
    source: intake.source,
    sourceRef: intake.sourceRef ?? null,
    deliveryId: intake.deliveryId ?? null,
    note: input.note ?? null,
    confirmedBy: input.confirmed ? enteredBy : null,
    confirmedAt: input.confirmed ? at : null,
  });
  const versions = cache.versions(row.pointId, row.parameterId);
  const verdict = judgeAndStore(db, row, at, "entered", { parameter, versions, isFirst: true });
  if (row.deliveryId === null) judgeDependents(db, row, at, "late-reading");
  return { row, verdict, isRepeat: false };
}

/** Judges a row that has just come to count, then what depends on it. */
export function judgeWithDependents(
  db: Orm,
  row: ReadingRow,
  at: number,
  own: JudgementCause,
  others: JudgementCause,
): StatusVerdict {
  const verdict = judgeAndStore(db, row, at, own);
  judgeDependents(db, row, at, others);
  return verdict;
}
