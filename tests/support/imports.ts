import type { Actor } from "@/modules/access";
import { JobRunner } from "@/modules/audit";
import {
  checkImport,
  commitImport,
  getImport,
  listStagedRows,
  receiveUpload,
  startCommit,
} from "@/modules/imports";
import type { ImportDetail, StagedRowView } from "@/modules/imports/model";
import { judgeSeriesAgain } from "@/modules/measurements";
import type { TestBench } from "./database";

async function* whole(bytes: Buffer | string): AsyncGenerator<Uint8Array> {
  yield Buffer.from(bytes as string);
}

/** Uploads a file as the route does, without HTTP. @throws Problem */
export function upload(bench: TestBench, actor: Actor, name: string, bytes: Buffer | string) {
  return receiveUpload(
    { db: bench.db, actor, clock: bench.clock, requestId: null },
    { name, body: whole(bytes), declaredBytes: null },
  );
}

/** Lets the server do what is due: checks, commits, and judgements that follow. */
export async function work(bench: TestBench): Promise<number> {
  return new JobRunner(bench.db, bench.clock, [checkImport, commitImport, judgeSeriesAgain]).drain();
}

export const detail = (bench: TestBench, actor: Actor, importId: number): ImportDetail =>
  bench.ask(actor, getImport, { importId });

/** Uploads a file and has it checked. */
export async function checked(bench: TestBench, actor: Actor, name: string, bytes: Buffer | string) {
  const { importId } = await upload(bench, actor, name, bytes);
  await work(bench);
  return detail(bench, actor, importId);
}

/** Uploads a file, has it checked and commits what is accepted. */
export async function committed(bench: TestBench, actor: Actor, name: string, bytes: Buffer | string) {
  const { id } = await checked(bench, actor, name, bytes);
  bench.run(actor, startCommit, { importId: id });
  await work(bench);
  return detail(bench, actor, id);
}

export const rows = (
  bench: TestBench,
  actor: Actor,
  importId: number,
  outcome: "accepted" | "duplicate" | "refused" | "all" = "all",
): StagedRowView[] => bench.ask(actor, listStagedRows, { importId, outcome, limit: 1000 }).rows;

type Stored = {
  typed_text: string;
  value: number | null;
  qualifier: string;
  taken_at: number;
  confirmed_by: number | null;
  status: string;
};

/** The readings in force, in the order of their moments. */
export const inForce = (bench: TestBench): Stored[] =>
  bench.db.reader.sqlite
    .prepare("select * from measurements_reading_in_force order by taken_at, id")
    .all() as Stored[];
