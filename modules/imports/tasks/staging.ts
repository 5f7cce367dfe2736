import { and, asc, between, eq, sql } from "drizzle-orm";
import type { Database, Orm } from "@/db/database";
import { DAY_MS } from "@/lib/clock";
import { upkeep } from "@/modules/audit";
import { equalFinder, foreseeVerdict, IntakeCache, type OfferedReading } from "@/modules/measurements";
import type { Qualifier } from "@/modules/measurements/model";
import type { Directory } from "../directory";
import type { MappedColumn, StagedProblem, StatusCounts } from "../model";
import { type ProgressRecord, saveProgress } from "../progress";
import { resolveReading } from "../resolve-reading";
import type { DraftRow } from "../rules/draft-rows";
import { readingUuid } from "../rules/reading-uuid";
import { stagedRow } from "../schema";

/** Of which import rows are staged, and what is known meanwhile. */
export type StagingOf = {
  importId: number;
  importCode: string;
  checkRun: number;
  sha256: string;
  columns: readonly MappedColumn[];
  directory: Directory;
};

type NewRow = typeof stagedRow.$inferInsert;

const NOTHING_FOUND = {
  readingUuid: null,
  pointId: null,
  parameterId: null,
  takenAt: null,
  value: null,
  qualifier: null,
  answer: null,
  identity: null,
  expectedStatus: null,
  expectedSentence: null,
} as const;

/** Twelve digits: what a conversion leaves in the last ones makes no difference. */
const identityOf = (of: OfferedReading): string =>
  [
    of.pointId,
    of.parameterId,
    of.takenAt,
    of.value === null ? "" : Number(of.value.toPrecision(12)),
    of.qualifier,
    of.answer ?? "",
  ].join(" ");

/** Finds what each reading of a file means, whether it is there already and what status it will have, and keeps it. */
export class Staging {
  #statements: Statements | null = null;

  constructor(
    private readonly db: Database,
    private readonly of: StagingOf,
  ) {}

  /**
   * Stages one slice of rows in one transaction and adds it up in `progress`. `lastLine` is given with the last slice of a
   * batch, when all its lines are staged.
   */
  stage(drafts: readonly DraftRow[], progress: ProgressRecord, at: number): ProgressRecord {
    return upkeep(this.db, (orm) => {
      const statements = (this.#statements ??= prepare(orm, this.of.importId));
      const cache = new IntakeCache(orm);
      const next = { ...progress, statusCounts: { ...progress.statusCounts }, updatedAt: at };
      for (const draft of drafts) {
        const row = this.#judge(orm, statements, draft, cache, at);
        statements.insert.run(row);
        next[row.outcome] += 1;
        const status = row.expectedStatus as keyof StatusCounts | null | undefined;
        if (row.outcome === "accepted" && status) next.statusCounts[status] += 1;
      }
      saveProgress(orm, next);
      return next;
    });
  }

  #judge(orm: Orm, statements: Statements, draft: DraftRow, cache: IntakeCache, at: number): NewRow {
    const { line, column, texts, candidate } = draft;
    const base = { importId: this.of.importId, line, column, ...NOTHING_FOUND };
    const remarks = candidate?.remarks ?? [];
    const refused = (problems: StagedProblem[]): NewRow => ({
      ...base,
      outcome: "refused",
      candidate: { texts, remarks, reading: null },
      problems,
    });
    if (candidate === null) return refused(draft.problems);
    const { columns, directory } = this.of;
    const resolved = resolveReading(candidate, { directory, columns, at });
    if (resolved.kind === "refused") return refused(resolved.problems);
    const { reading, offered } = resolved;
    const identity = identityOf(offered);
    const kept = { ...base, candidate: { texts, remarks, reading }, identity };
    const twin = findDuplicate(statements, offered, identity);
    if (twin) return { ...kept, outcome: "duplicate", problems: [twin] };
    const verdict = foreseeVerdict(orm, offered, cache, () => readAlongside(statements, offered));
    return {
      ...kept,
      outcome: "accepted",
      problems: [],
      readingUuid: readingUuid(this.of, line, column),
      pointId: offered.pointId,
      parameterId: offered.parameterId,
      takenAt: offered.takenAt,
      value: offered.value,
      qualifier: offered.qualifier,
      answer: offered.answer,
      expectedStatus: verdict.status,
      expectedSentence: verdict.sentence,
    };
  }
}

/** Why a reading is there already, in force or on an earlier line; or null. */
function findDuplicate(
  statements: Statements,
  offered: OfferedReading,
  identity: string,
): StagedProblem | null {
  const known = statements.findEqual(offered);
  if (known) {
    const from = known.sourceRef === null ? "" : `, brought in by ${known.sourceRef}`;
    return duplicate("already-in-force", `This very reading is stored already${from}.`);
  }
  const twin = statements.twin.get({ identity });
  return twin
    ? duplicate("twice-in-file", `The same reading stands on line ${twin.line} of this file.`)
    : null;
}

/** Readings of this file that would be stored with one, of the 24 h before it. */
function readAlongside(statements: Statements, { pointId, parameterId, takenAt }: OfferedReading) {
  return statements.alongside
    .all({ pointId, parameterId, from: takenAt - DAY_MS, to: takenAt })
    .map(({ id, takenAt: earlier, value, qualifier }) => ({
      id: `staged ${id}`,
      takenAt: earlier ?? 0,
      value,
      qualifier: (qualifier ?? "") as Qualifier,
    }));
}

const duplicate = (code: "already-in-force" | "twice-in-file", reason: string): StagedProblem => ({
  columnName: null,
  code,
  reason,
  mend: "Nothing needs to be done: it is left out.",
  text: null,
});

const named = (name: string) => sql.placeholder(name);

/** Statements that are used once a row, prepared once a file. */
function prepare(orm: Orm, importId: number) {
  const mine = eq(stagedRow.importId, importId);
  const accepted = eq(stagedRow.outcome, "accepted");
  return {
    twin: orm
      .select({ line: stagedRow.line })
      .from(stagedRow)
      .where(and(mine, eq(stagedRow.identity, named("identity")), accepted))
      .limit(1)
      .prepare(),
    alongside: orm
      .select({
        id: stagedRow.id,
        takenAt: stagedRow.takenAt,
        value: stagedRow.value,
        qualifier: stagedRow.qualifier,
      })
      .from(stagedRow)
      .where(
        and(
          mine,
          eq(stagedRow.pointId, named("pointId")),
          eq(stagedRow.parameterId, named("parameterId")),
          between(stagedRow.takenAt, named("from"), named("to")),
          accepted,
        ),
      )
      .orderBy(asc(stagedRow.takenAt))
      .prepare(),
    findEqual: equalFinder(orm),
    insert: prepareInsert(orm),
  };
}

type Statements = ReturnType<typeof prepare>;

function prepareInsert(orm: Orm) {
  return orm
    .insert(stagedRow)
    .values({
      importId: named("importId"),
      line: named("line"),
      column: named("column"),
      outcome: named("outcome"),
      candidate: named("candidate"),
      problems: named("problems"),
      readingUuid: named("readingUuid"),
      pointId: named("pointId"),
      parameterId: named("parameterId"),
      takenAt: named("takenAt"),
      value: named("value"),
      qualifier: named("qualifier"),
      answer: named("answer"),
      identity: named("identity"),
      expectedStatus: named("expectedStatus"),
      expectedSentence: named("expectedSentence"),
    })
    .prepare();
}
