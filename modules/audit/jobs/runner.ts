import type { z } from "zod";
import type { Database } from "@/db/database";
import { type Clock, MINUTE_MS, SECOND_MS } from "@/lib/clock";
import { log } from "@/lib/log";
import { SYSTEM_ACTOR } from "@/modules/access";
import type { Command, QueuedWork } from "../define-command";
import { runCommand } from "../run-command";
import { upkeep } from "../upkeep";

type TaskDeps = { db: Database; clock: Clock };

type TaskDefinition<S extends z.ZodType> = {
  verb: string;
  /** Tasks of one lane go one after the other; lanes do not wait for each other. */
  lane: "mail" | "files";
  input: S;
  perform(deps: TaskDeps, input: z.output<S>): Promise<void>;
};

/** Work that waits for something outside the database (a child process, a mail server) between its commands. */
export type Task<I = unknown> = QueuedWork<I> & {
  readonly lane: "mail" | "files";
  perform(deps: TaskDeps, raw: unknown): Promise<void>;
};

/** A task by name, for `enqueue` and for the table of work. */
export function defineTask<S extends z.ZodType>(task: TaskDefinition<S>): Task<z.output<S>> {
  return {
    verb: task.verb,
    lane: task.lane,
    perform: (deps, raw) => task.perform(deps, task.input.parse(raw)),
  };
}

export type WorkTable = readonly (Command | Task)[];

type JobRow = { id: number; kind: string; input: string; attempts: number };

const MAX_ATTEMPTS = 8;
const IDLE_WAIT_MS = 500;
/** 2 s, 4 s, 8 s … at most 30 minutes between tries. */
const backoffMs = (attempts: number): number => Math.min(2 ** attempts * SECOND_MS, 30 * MINUTE_MS);

const DUE =
  "select id, kind, input, attempts from audit_job where done_at is null and failed_at is null and run_at <= ? " +
  "and kind in (select value from json_each(?)) order by run_at, id limit 1";

/** Carries out jobs one after the other, at least once each; what fails is tried again later, then left marked as failed. */
export class JobRunner {
  readonly #work: Map<string, Command | Task>;
  readonly #lanes: string[];
  #stopped = false;
  #loops: Promise<void>[] = [];

  constructor(
    private readonly db: Database,
    private readonly clock: Clock,
    work: WorkTable,
  ) {
    this.#work = new Map(work.map((item) => [item.verb, item]));
    const byLane: Record<string, string[]> = {};
    for (const item of work) {
      const lane = "perform" in item ? item.lane : "commands";
      byLane[lane] = [...(byLane[lane] ?? []), item.verb];
    }
    this.#lanes = Object.values(byLane).map((verbs) => JSON.stringify(verbs));
  }

  start(): void {
    if (this.#loops.length === 0) this.#loops = this.#lanes.map((lane) => this.#run(lane));
  }

  async stop(): Promise<void> {
    this.#stopped = true;
    await Promise.all(this.#loops);
  }

  /** Carries out everything that is due now; answers how many jobs. For tests, seeds and command-line tools. */
  async drain(limit = 100_000): Promise<number> {
    let done = 0;
    for (let before = -1; before < done && done < limit; ) {
      before = done;
      for (const lane of this.#lanes) while (done < limit && (await this.#next(lane))) done += 1;
    }
    return done;
  }

  async #run(lane: string): Promise<void> {
    while (!this.#stopped) {
      const did = await this.#next(lane).catch((cause: unknown) => {
        log().error({ err: cause }, "the job runner could not take a job");
        return false;
      });
      await new Promise((resolve) => (did ? setImmediate(resolve) : setTimeout(resolve, IDLE_WAIT_MS)));
    }
  }

  async #next(lane: string): Promise<boolean> {
    const job = this.db.writer.sqlite.prepare(DUE).get(this.clock.now(), lane) as JobRow | undefined;
    if (!job) return false;
    try {
      await this.#perform(job);
      upkeep(this.db, () => {
        this.db.writer.sqlite
          .prepare("update audit_job set done_at = ? where id = ?")
          .run(this.clock.now(), job.id);
      });
    } catch (cause) {
      this.#fail(job, cause);
    }
    return true;
  }

  async #perform(job: JobRow): Promise<void> {
    const work = this.#work.get(job.kind);
    if (!work) throw new Error(`no work is known by the name ${job.kind}`);
    const input: unknown = JSON.parse(job.input);
    if ("perform" in work) {
      await work.perform({ db: this.db, clock: this.clock }, input);
      return;
    }
    runCommand(this.db, SYSTEM_ACTOR, work, input, { clock: this.clock, requestId: `job:${job.id}` });
  }

  #fail(job: JobRow, cause: unknown): void {
    const attempts = job.attempts + 1;
    const now = this.clock.now();
    const message = cause instanceof Error ? cause.message : String(cause);
    log().error({ err: cause, job: job.id, kind: job.kind, attempts }, "a job failed");
    upkeep(this.db, () => {
      this.db.writer.sqlite
        .prepare("update audit_job set attempts = ?, error = ?, run_at = ?, failed_at = ? where id = ?")
        .run(attempts, message, now + backoffMs(attempts), attempts >= MAX_ATTEMPTS ? now : null, job.id);
    });
  }
}
