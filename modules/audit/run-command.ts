import { createHash } from "node:crypto";
import canonicalize from "canonicalize";
import type { z } from "zod";
import { assertDurable, type Database, type Sqlite } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import type { Actor } from "@/modules/access";
import { mayInArea } from "@/modules/access";
import type { Command, CommandContext } from "./define-command";
import { insertJob, jobsFor } from "./jobs/queue";
import type { HistoryEvent } from "./model";
import { mustBeAllowed } from "./must-be-allowed";
import { parseInput } from "./parse-input";
import { chainHead, sealEntry } from "./seal";

export type RunOptions = {
  clock: Clock;
  requestId?: string | null;
  /** What a client creates carries its UUID: the same key twice is carried out once. */
  idempotencyKey?: string | null;
  /** The actor has just proven their password again; a command that is a signature asks for it. */
  passwordConfirmed?: boolean;
};

export type Answer<R> = { result: R; entryId: number; replayed: boolean };

type Kept = {
  actor_id: number | null;
  command: string;
  input_hash: string;
  answer: string;
  entry_id: number;
};

function mustBeInOwnAreas(actor: Actor, command: Command, areas: Iterable<number>): void {
  for (const areaId of areas) {
    if (mayInArea(actor, command.permission, areaId)) continue;
    throw new Problem(
      "not-allowed",
      `You may ${command.permission.says} only in the areas you are assigned to.`,
    );
  }
}

function keptAnswer<R>(
  sqlite: Sqlite,
  key: string,
  actor: Actor,
  command: Command,
  inputHash: string,
): Answer<R> | null {
  const kept = sqlite.prepare("select * from audit_idempotency where key = ?").get(key) as Kept | undefined;
  if (!kept) return null;
  const isSame =
    kept.actor_id === actor.personId && kept.command === command.verb && kept.input_hash === inputHash;
  if (!isSame) {
    throw new Problem("key-reused", "This idempotency key has been used for something else; send a new one.");
  }
  return { result: JSON.parse(kept.answer) as R, entryId: kept.entry_id, replayed: true };
}

const inputHashOf = (input: unknown): string =>
  createHash("sha256")
    .update(canonicalize(input) ?? "null")
    .digest("hex");

function seal(db: Database, actor: Actor, event: HistoryEvent, at: number, requestId: string | null): void {
  const { sqlite, openEntry } = db.writer;
  invariant(openEntry !== null, "an entry is open");
  sealEntry(sqlite, {
    id: openEntry,
    at,
    verb: event.kind.verb,
    version: event.kind.version,
    actorKind: actor.kind,
    actorId: actor.personId,
    roles: JSON.stringify(actor.roles),
    subjectType: event.subject?.type ?? null,
    subjectId: event.subject ? String(event.subject.id) : null,
    reason: event.reason ?? null,
    payload: canonicalize(event.payload ?? {}) ?? "{}",
    requestId,
    prevHash: chainHead(sqlite).hash,
  });
}

const checked = new WeakSet<Sqlite>();

/**
 * The one way anything changes: may, begin, do, seal, commit (who and what are settled by the caller and the schema).
 * Synchronous from BEGIN to COMMIT, so that commands never interleave and no mail or file work can creep in.
 * @throws Problem for every expected refusal; then nothing was written, the history included.
 */
export function runCommand<S extends z.ZodType, R>(
  db: Database,
  actor: Actor,
  command: Command<S, R>,
  rawInput: z.input<S>,
  options: RunOptions,
): Answer<R> {
  mustBeAllowed(actor, command.permission);
  const input = parseInput(command.input, rawInput);
  if (command.signed && !options.passwordConfirmed) {
    throw new Problem("wrong-password", "Signing asks for your password; it is not right.");
  }
  const { sqlite } = db.writer;
  invariant(db.writer.openEntry === null, "commands do not nest");
  sqlite.exec("begin immediate");
  try {
    const answer = carryOut(db, actor, command, input, rawInput, options);
    sqlite.exec("commit");
    if (!checked.has(sqlite)) {
      assertDurable(sqlite);
      checked.add(sqlite);
    }
    return answer;
  } catch (cause) {
    if (sqlite.inTransaction) sqlite.exec("rollback");
    throw cause;
  } finally {
    db.writer.openEntry = null;
  }
}

function carryOut<S extends z.ZodType, R>(
  db: Database,
  actor: Actor,
  command: Command<S, R>,
  input: z.output<S>,
  rawInput: unknown,
  options: RunOptions,
): Answer<R> {
  const { sqlite, orm } = db.writer;
  const inputHash = options.idempotencyKey ? inputHashOf(rawInput) : "";
  if (options.idempotencyKey) {
    const kept = keptAnswer<R>(
      sqlite,
      options.idempotencyKey,
      actor,
      command as unknown as Command,
      inputHash,
    );
    if (kept) return kept;
  }
  const at = options.clock.now();
  const entryId = chainHead(sqlite).id + 1;
  db.writer.openEntry = entryId;
  const ctx: CommandContext = {
    db: orm,
    actor,
    at,
    entryId,
    requestId: options.requestId ?? null,
    enqueue: (work, workInput, runAt = at) => insertJob(sqlite, work.verb, workInput, entryId, at, runAt),
  };
  if (command.areas) mustBeInOwnAreas(actor, command as unknown as Command, command.areas(ctx, input));
  const { result, event } = command.run(ctx, input);
  for (const job of jobsFor(event)) insertJob(sqlite, job.verb, job.input, entryId, at, at);
  seal(db, actor, event, at, ctx.requestId);
  const answer: Answer<R> = { result, entryId, replayed: false };
  if (options.idempotencyKey) {
    keepAnswer(sqlite, options.idempotencyKey, { actor, command: command.verb, inputHash, at }, answer);
  }
  return answer;
}

const KEEP_ANSWER =
  "insert into audit_idempotency (key, actor_id, command, input_hash, answer, entry_id, at) values (?, ?, ?, ?, ?, ?, ?)";

type Asked = { actor: Actor; command: string; inputHash: string; at: number };

/** Keeps the first answer under its key, without expiry, so that the same send is answered alike. */
function keepAnswer(sqlite: Sqlite, key: string, asked: Asked, answer: Answer<unknown>): void {
  const { actor, command, inputHash, at } = asked;
  const json = JSON.stringify(answer.result ?? null);
  sqlite.prepare(KEEP_ANSWER).run(key, actor.personId, command, inputHash, json, answer.entryId, at);
}
