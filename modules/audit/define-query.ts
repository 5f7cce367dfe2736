import { type SQL, type SQLWrapper, sql } from "drizzle-orm";
import type { z } from "zod";
import type { Orm } from "@/db/database";
import type { Actor, Permission } from "@/modules/access";
import { visibleAreas } from "@/modules/access";
import { mustBeAllowed } from "./must-be-allowed";
import { parseInput } from "./parse-input";

/** What a query's `run` is given. */
export type QueryContext = {
  readonly db: Orm;
  readonly actor: Actor;
  readonly at: number;
  /** The areas whose rows the actor may see; null means all. */
  readonly areaIds: readonly number[] | null;
  /** SQL that keeps the rows of the areas that the actor may see. */
  inMyAreas(column: SQLWrapper): SQL;
};

export type Query<S extends z.ZodType = z.ZodType, R = unknown> = {
  readonly name: string;
  readonly permission: Permission;
  readonly input: S;
  run(ctx: QueryContext, input: z.output<S>): R;
};

/** One question. Filters its rows by the actor's areas where its permission is bounded. */
export function defineQuery<S extends z.ZodType, R>(definition: Query<S, R>): Query<S, R> {
  return definition;
}

/**
 * Asks a question as an actor.
 * @throws Problem `not-allowed` where the actor has no such permission, `invalid` where the input is wrong.
 */
export function ask<S extends z.ZodType, R>(
  from: { db: Orm; actor: Actor; at: number },
  query: Query<S, R>,
  rawInput: z.input<S>,
): R {
  mustBeAllowed(from.actor, query.permission);
  const areaIds = visibleAreas(from.actor, query.permission);
  const ctx: QueryContext = {
    ...from,
    areaIds,
    inMyAreas: (column) => (areaIds === null ? sql`true` : sql`${column} in ${[...areaIds]}`),
  };
  return query.run(ctx, parseInput(query.input, rawInput));
}
