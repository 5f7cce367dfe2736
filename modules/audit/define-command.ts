import type { z } from "zod";
import type { Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import type { Actor, Permission } from "@/modules/access";
import type { HistoryEvent } from "./model";

/** What a command's `run` is given. `db` writes inside the command's transaction; `at` is the moment of the act. */
export type CommandContext = {
  readonly db: Orm;
  readonly actor: Actor;
  readonly at: number;
  /** The id that the history entry will have. */
  readonly entryId: number;
  readonly requestId: string | null;
  /** Work for after COMMIT, written in the same transaction. */
  enqueue<I>(work: QueuedWork<I>, input: I, runAt?: number): void;
};

/** Something that can be carried out later by name: a command by the system, or a task. */
export type QueuedWork<I = unknown> = { readonly verb: string; takes?(input: I): void };

export type CommandOutcome<R> = { result: R; event: HistoryEvent };

type Definition<S extends z.ZodType, R, P extends Permission> = {
  /** `recordReadings`: verb and noun, as the file is named. */
  verb: string;
  permission: P;
  /** Strict schema of what people, files and machines send. */
  input: S;
  /** A signature: whoever acts has just proven their password again (the caller says so in the options). */
  signed?: boolean;
  /** Load and check state inside the transaction, decide by rules, write. Synchronous; throws `Problem` to refuse. */
  run(ctx: CommandContext, input: z.output<S>): CommandOutcome<R>;
} & (P extends Permission<true>
  ? {
      /** The areas this act touches; each must be among the actor's own where the permission is bounded. */
      areas(ctx: Pick<CommandContext, "db" | "actor" | "at">, input: z.output<S>): Iterable<number>;
    }
  : { areas?: never });

export type Command<S extends z.ZodType = z.ZodType, R = unknown> = {
  readonly verb: string;
  readonly permission: Permission;
  readonly input: S;
  readonly signed?: boolean;
  run(ctx: CommandContext, input: z.output<S>): CommandOutcome<R>;
  areas?(ctx: Pick<CommandContext, "db" | "actor" | "at">, input: z.output<S>): Iterable<number>;
};

/** The only way to make something that writes. A command without a permission does not compile. */
export function defineCommand<S extends z.ZodType, R, P extends Permission>(
  definition: Definition<S, R, P>,
): Command<S, R> {
  const { permission } = definition;
  invariant(
    !permission.bounded || definition.areas,
    `${definition.verb} has a bounded permission and must name its areas`,
  );
  return definition as unknown as Command<S, R>;
}
