import type { z } from "zod";
import type { Database } from "@/db/database";
import { MINUTE_MS, SetClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { invariant } from "@/lib/invariant";
import { addDays, localToEpoch, operationalDayOf } from "@/lib/zone";
import { type Actor, SYSTEM_ACTOR } from "@/modules/access";
import { ask, type Command, JobRunner, type Query, runCommand, type WorkTable } from "@/modules/audit";
import { actorOf } from "@/modules/identity";

/** How far the demonstration reaches back. */
export const DAYS = 182;

/** Where the demonstration is made: the database, a clock that is told the time, and people who act. */
export class Stage {
  readonly #scenes: { at: number; scene: () => void | Promise<void> }[] = [];
  readonly clock: SetClock;
  readonly people = new Map<string, number>();
  readonly areaIds = new Map<string, number>();
  readonly systemIds = new Map<string, number>();
  /** By `KELP-01/SURFACE`. */
  readonly pointIds = new Map<string, number>();
  readonly parameterIds = new Map<string, number>();
  readonly instrumentIds = new Map<string, number>();
  readonly methodIds = new Map<string, number>();
  /** The operational day on which the demonstration is made. */
  readonly today: string;

  constructor(
    readonly db: Database,
    readonly now: number,
    private readonly work: WorkTable,
  ) {
    this.clock = new SetClock(now);
    const { STILLWELL_ZONE, dayCutMinutes } = settings();
    this.today = operationalDayOf(now, STILLWELL_ZONE, dayCutMinutes);
  }

  /** A calendar day so many days before today. */
  day(daysAgo: number): string {
    return addDays(this.today, -daysAgo);
  }

  /** A moment by the facility's clock, `at` as "08:10"; a doubled hour is its first, a missing one the hour after. */
  moment(daysAgo: number, at: string): number {
    const read = localToEpoch({
      on: this.day(daysAgo),
      at,
      zone: settings().STILLWELL_ZONE,
      disambiguation: "earlier",
    });
    return read.kind === "one" ? read.epochMs : read.later.epochMs;
  }

  who(key: string): Actor {
    if (key === "system") return SYSTEM_ACTOR;
    const actor = actorOf(this.db.writer.orm, this.people.get(key) ?? 0, this.clock.now());
    invariant(actor, `${key} is one of the demonstration's people`);
    return actor;
  }

  /** Acts as a person at a moment; signatures are given. */
  act<S extends z.ZodType, R>(key: string, at: number, command: Command<S, R>, input: z.input<S>): R {
    this.clock.set(at);
    return runCommand(this.db, this.who(key), command, input, { clock: this.clock, passwordConfirmed: true })
      .result;
  }

  ask<S extends z.ZodType, R>(key: string, query: Query<S, R>, input: z.input<S>): R {
    return ask({ db: this.db.writer.orm, actor: this.who(key), at: this.clock.now() }, query, input);
  }

  /** Puts something onto the time line; it happens when the play comes to it. */
  plan(at: number, scene: () => void | Promise<void>): void {
    this.#scenes.push({ at, scene });
  }

  /** Plays everything planned in the order of time; what would lie after now does not happen. */
  async play(): Promise<void> {
    const scenes = this.#scenes.splice(0).toSorted((a, b) => a.at - b.at);
    for (const { at, scene } of scenes) {
      if (at > this.now) continue;
      this.clock.set(at);
      await scene();
    }
  }

  /** Carries out what commands have asked for until now. */
  async settle(): Promise<void> {
    this.clock.set(this.clock.now() + MINUTE_MS);
    await new JobRunner(this.db, this.clock, this.work).drain();
  }

  point(system: string, code?: string): number {
    const id = this.pointIds.get(code ? `${system}/${code}` : system);
    invariant(id, `there is a point ${system} ${code ?? ""}`);
    return id;
  }

  parameter(code: string): number {
    const id = this.parameterIds.get(code);
    invariant(id, `there is a parameter ${code}`);
    return id;
  }
}
