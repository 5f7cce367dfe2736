import { randomUUID } from "node:crypto";
import { z } from "zod";
import { type Actor, definePermissions, SYSTEM_ACTOR } from "@/modules/access";
import { defineCommand } from "@/modules/audit";
import type { LimitShape } from "@/modules/measurements/model";
import { limitVersion, limitWorkbook } from "@/modules/measurements/schema";
import { parameter } from "@/modules/methods/schema";
import { area, point, site, system } from "@/modules/systems/schema";
import type { TestBench } from "./database";

const testMay = definePermissions("test", { addWater: { says: "add water for a test", roles: "system" } });

const addArea = defineCommand({
  verb: "addAreaForTest",
  permission: testMay.addWater,
  input: z.strictObject({ code: z.string(), order: z.number() }),
  run(ctx, { code, order }) {
    const home =
      ctx.db.select().from(site).get() ??
      ctx.db.insert(site).values({ code: "CS", name: "Corran Sound" }).returning().get();
    const added = ctx.db
      .insert(area)
      .values({ siteId: home.id, code, name: `${code} gallery`, biosecurityLevel: 1, walkingOrder: order })
      .returning()
      .get();
    return { result: added.id, event: { kind: { verb: "area.added-for-test", version: 1, says: "" } } };
  },
});

const addSystem = defineCommand({
  verb: "addSystemForTest",
  permission: testMay.addWater,
  input: z.strictObject({ areaId: z.number(), code: z.string() }),
  run(ctx, { areaId, code }) {
    const added = ctx.db
      .insert(system)
      .values({
        areaId,
        code,
        name: `${code} tank`,
        kind: "exhibit",
        waterType: "seawater",
        state: "in-service",
        walkingOrder: 1,
        createdAt: ctx.at,
      })
      .returning()
      .get();
    const main = ctx.db
      .insert(point)
      .values({ systemId: added.id, code: "surface", name: "Surface", kind: "surface", isDefault: true })
      .returning()
      .get();
    return {
      result: { systemId: added.id, pointId: main.id },
      event: { kind: { verb: "system.added-for-test", version: 1, says: "" } },
    };
  },
});

const addParameter = defineCommand({
  verb: "addParameterForTest",
  permission: testMay.addWater,
  input: z.any(),
  run(ctx, values: typeof parameter.$inferInsert) {
    const added = ctx.db.insert(parameter).values(values).returning().get();
    return { result: added.id, event: { kind: { verb: "parameter.added-for-test", version: 1, says: "" } } };
  },
});

const setLimits = defineCommand({
  verb: "setLimitsForTest",
  permission: testMay.addWater,
  input: z.any(),
  run(
    ctx,
    row: { pointId: number; parameterId: number; shape: LimitShape; fromAt: number; version: number },
  ) {
    const book = ctx.db
      .insert(limitWorkbook)
      .values({ title: "Test", reason: "Test", state: "approved", proposedBy: 1, proposedAt: ctx.at })
      .returning()
      .get();
    const added = ctx.db
      .insert(limitVersion)
      .values({
        workbookId: book.id,
        pointId: row.pointId,
        parameterId: row.parameterId,
        version: row.version,
        state: "approved",
        effectiveFromAt: row.fromAt,
        shape: row.shape,
      })
      .returning()
      .get();
    return { result: added.id, event: { kind: { verb: "limits.set-for-test", version: 1, says: "" } } };
  },
});

/** Temperature in °C with °F accepted, and ammonia as N: enough water for most tests. */
const TEMPERATURE: typeof parameter.$inferInsert = {
  code: "temperature",
  name: "Temperature",
  kind: "number",
  unit: "°C",
  acceptedUnits: ["°C", "°F"],
  decimals: 1,
  plausibleLow: -2,
  plausibleHigh: 45,
  choices: [],
  group: "physics",
  mayBeNegative: true,
};
const AMMONIA: typeof parameter.$inferInsert = {
  ...TEMPERATURE,
  code: "ammonia_n",
  name: "Ammonia",
  unit: "mg/L",
  acceptedUnits: ["mg/L"],
  decimals: 3,
  plausibleLow: 0,
  plausibleHigh: 20,
  group: "nutrients",
  mayBeNegative: false,
};

/** One area with one system and two parameters, and short ways to set limits and to read. */
export function waterFor(bench: TestBench, code = "KELP") {
  const areaId = bench.run(SYSTEM_ACTOR, addArea, { code, order: 1 });
  const { systemId, pointId } = bench.run(SYSTEM_ACTOR, addSystem, { areaId, code: `${code}-01` });
  const known = bench.db.reader.sqlite.prepare("select id, code from methods_parameter").all() as {
    id: number;
    code: string;
  }[];
  const idOf = (values: typeof parameter.$inferInsert) =>
    known.find((row) => row.code === values.code)?.id ?? bench.run(SYSTEM_ACTOR, addParameter, values);
  let version = 0;
  return {
    areaId,
    systemId,
    pointId,
    temperatureId: idOf(TEMPERATURE),
    ammoniaId: idOf(AMMONIA),
    limit(parameterId: number, shape: LimitShape, fromAt = 0) {
      version += 1;
      return bench.run(SYSTEM_ACTOR, setLimits, { pointId, parameterId, shape, fromAt, version });
    },
    reading(parameterId: number, typedText: string, takenAt: number, more: Record<string, unknown> = {}) {
      return { uuid: randomUUID(), pointId, parameterId, typedText, takenAt, ...more };
    },
  };
}

export type Water = ReturnType<typeof waterFor>;
export type { Actor };
