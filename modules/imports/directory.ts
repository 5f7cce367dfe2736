import { sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { type Actor, mayInArea, SYSTEM_ACTOR } from "@/modules/access";
import type { QueryContext } from "@/modules/audit";
import { listPersonNames } from "@/modules/identity";
import { allParameters, listInstruments, listMethods } from "@/modules/methods";
import type { FacilityParameter } from "@/modules/methods/model";
import { pointDirectory } from "@/modules/systems";
import { importsMay } from "./abilities";
import type { KnownParameter } from "./model";

export type Place = typeof pointDirectory.$inferSelect;
type SystemPlaces = {
  code: string;
  name: string;
  state: string;
  areaName: string;
  mayHere: boolean;
  points: Place[];
};
type Named = { id: number; code: string };

/** Everything a file may name, by the words by which it may name it. */
export type Directory = {
  systems: Words<SystemPlaces>;
  parameters: Words<FacilityParameter>;
  methods: Words<Named & { parameterId: number }>;
  instruments: Words<Named>;
  people: Words<{ id: number; name: string }>;
};

/** Things by their names, without regard to case and outer blanks; a name of two things stands for both. */
export class Words<T> {
  readonly #byWord = new Map<string, T[]>();
  readonly all: T[] = [];

  add(thing: T, ...names: string[]): void {
    this.all.push(thing);
    for (const key of new Set(names.map(keyOf))) {
      if (key !== "") this.#byWord.set(key, [...(this.#byWord.get(key) ?? []), thing]);
    }
  }

  find(name: string): readonly T[] {
    return this.#byWord.get(keyOf(name)) ?? [];
  }
}

const keyOf = (name: string): string => name.replace(/\s+/g, " ").trim().toLowerCase();

/** How the server itself asks a question of another module. */
export const serverAsks = (db: Orm, at: number): QueryContext => ({
  db,
  actor: SYSTEM_ACTOR,
  at,
  areaIds: null,
  inMyAreas: () => sql`true`,
});

/** What is known at a moment; `actor` is the person whose areas count. */
export function readDirectory(db: Orm, actor: Actor, at: number): Directory {
  const ctx = serverAsks(db, at);
  const directory: Directory = {
    systems: systemWords(db, actor),
    parameters: new Words(),
    methods: new Words(),
    instruments: new Words(),
    people: new Words(),
  };
  for (const each of allParameters(db)) directory.parameters.add(each, each.code, each.name);
  for (const each of listMethods.run(ctx, { includeRetired: true }))
    directory.methods.add(each, each.code, each.name);
  for (const each of listInstruments.run(ctx, { includeRetired: true }))
    directory.instruments.add(each, each.code, each.serial);
  const people = listPersonNames.run(ctx, {}).filter((person) => person.state === "active");
  for (const each of people) directory.people.add(each, each.name);
  return directory;
}

function systemWords(db: Orm, actor: Actor): Words<SystemPlaces> {
  const bySystem = new Map<number, SystemPlaces>();
  const words = new Words<SystemPlaces>();
  for (const place of db.select().from(pointDirectory).all()) {
    const known = bySystem.get(place.systemId);
    if (known) known.points.push(place);
    else
      bySystem.set(place.systemId, {
        code: place.systemCode,
        name: place.systemName,
        state: place.systemState,
        areaName: place.areaName,
        mayHere: mayInArea(actor, importsMay.upload, place.areaId),
        points: [place],
      });
  }
  for (const each of bySystem.values()) words.add(each, each.code, each.name);
  return words;
}

/** The parameters that a header may name. */
export const knownParameters = (db: Orm): KnownParameter[] =>
  allParameters(db).map(({ code, name }) => ({ code, names: [name] }));
