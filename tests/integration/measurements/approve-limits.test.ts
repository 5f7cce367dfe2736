import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import type { z } from "zod";
import { WORK } from "@/app/_server/reactions";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import { JobRunner, verifyHistory } from "@/modules/audit";
import {
  decideLimits,
  getLimitWorkbook,
  limitsInForce,
  listLimitBoard,
  listLimitTemplates,
  planWatch,
  proposeLimits,
  recordReadings,
  saveLimitTemplate,
} from "@/modules/measurements";
import type { proposeLimitsInput } from "@/modules/measurements/input";
import type { LimitShape } from "@/modules/measurements/model";
import { judgement, limitVersion, readingInForce } from "@/modules/measurements/schema";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

type Rows = z.input<typeof proposeLimitsInput>["rows"];

const constant = (bounds: object) => ({ kind: "constant" as const, bounds });

function begin() {
  const bench = testBench(NOON);
  const water = waterFor(bench);
  const ines = bench.person("Ines Marlow", ["lead"]);
  const noor = bench.person("Noor Haddaway", ["lead", "analyst", "aquarist"]);
  const row = (shape: LimitShape, more: object = {}) => ({
    pointId: water.pointId,
    parameterId: water.temperatureId,
    effectiveFromAt: NOON,
    shape: structuredClone(shape) as Rows[number]["shape"],
    ...more,
  });
  const propose = (rows: Rows, by = noor) =>
    bench.run(by, proposeLimits, { title: "Cooler kelp", reason: "The sea is cooler this year", rows })
      .workbookId;
  const decide = (
    workbookId: number,
    by = ines,
    decision: "approve" | "decline" = "approve",
    comment = "Agreed",
  ) => bench.run(by, decideLimits, { workbookId, decision, comment });
  const inForce = (at: number, parameterId = water.temperatureId, pointId = water.pointId) =>
    limitsInForce(bench.db.reader.orm, pointId, parameterId, at);
  const settle = () => new JobRunner(bench.db, bench.clock, WORK).drain();
  const take = (text: string, at: number) =>
    bench.run(noor, recordReadings, { readings: [water.reading(water.temperatureId, text, at)] }).readings[0];
  const statusOf = (id: number | undefined) =>
    bench.db.reader.orm
      .select()
      .from(readingInForce)
      .where(eq(readingInForce.id, id ?? 0))
      .get();
  return { bench, water, ines, noor, row, propose, decide, inForce, settle, take, statusOf };
}

const refusal = (
  act: () => unknown,
): { code: string; message: string; errors: { pointer: string; detail: string }[] } => {
  try {
    act();
  } catch (error) {
    return error as ReturnType<typeof refusal>;
  }
  throw new Error("it was not refused");
};

describe("proposed limits", () => {
  it("do not hold until another person has approved them", () => {
    const { row, propose, decide, inForce } = begin();
    const id = propose([row(constant({ toleranceHigh: 14 }))]);
    expect(inForce(NOON)).toEqual({ state: "none" });
    decide(id);
    expect(inForce(NOON)).toMatchObject({ state: "in-force", version: 1, bounds: { toleranceHigh: 14 } });
    expect(inForce(NOON - 1)).toEqual({ state: "none" });
  });

  it("are decided on by nobody who proposed them, whatever roles they hold", () => {
    const { bench, noor, row, propose, decide, inForce } = begin();
    const id = propose([row(constant({ toleranceHigh: 14 }))]);
    for (const decision of ["approve", "decline"] as const) {
      const refused = refusal(() => decide(id, noor, decision));
      expect(refused.code).toBe("own-work");
      expect(refused.message).toContain("another person");
    }
    expect(inForce(NOON)).toEqual({ state: "none" });
    expect(bench.ask(noor, getLimitWorkbook, { workbookId: id })).toMatchObject({
      workbook: { state: "proposed", decidedBy: null },
      signatures: [],
    });
  });

  it("are decided on by nobody but a lead, and not without a password", () => {
    const { bench, ines, row, propose, decide } = begin();
    const id = propose([row(constant({ toleranceHigh: 14 }))]);
    for (const role of [
      "aquarist",
      "operator",
      "analyst",
      "veterinarian",
      "auditor",
      "admin",
      "reader",
    ] as const) {
      const someone = bench.person(`Somebody ${role}`, [role]);
      expect(refusal(() => decide(id, someone)).code).toBe("not-allowed");
    }
    const input = { workbookId: id, decision: "approve" as const };
    const unsigned = refusal(() => bench.run(ines, decideLimits, input, { passwordConfirmed: false }));
    expect(unsigned.code).toBe("wrong-password");
    decide(id);
  });

  it("are declined with a reason alone, and what was in force stays", () => {
    const { row, propose, decide, inForce, ines } = begin();
    decide(propose([row(constant({ toleranceHigh: 14 }))]));
    const id = propose([row(constant({ toleranceHigh: 20 }))]);
    expect(refusal(() => decide(id, ines, "decline", "")).errors[0]).toMatchObject({ pointer: "/comment" });
    decide(id, ines, "decline", "Too wide for the kelp");
    expect(inForce(NOON)).toMatchObject({ version: 1, bounds: { toleranceHigh: 14 } });
    expect(refusal(() => decide(id)).code).toBe("conflict");
  });

  it("are approved as a whole workbook, with one signature over what was approved", () => {
    const { bench, water, ines, row, propose, decide, inForce } = begin();
    const id = propose([
      row(constant({ toleranceHigh: 14 })),
      { ...row(constant({ toleranceHigh: 0.1 })), parameterId: water.ammoniaId },
    ]);
    decide(id);
    expect(inForce(NOON).state).toBe("in-force");
    expect(inForce(NOON, water.ammoniaId)).toMatchObject({ bounds: { toleranceHigh: 0.1 } });
    const { signatures, rows } = bench.ask(ines, getLimitWorkbook, { workbookId: id });
    expect(rows).toHaveLength(2);
    expect(signatures).toMatchObject([
      { printedName: "Ines Marlow", meaning: "approved", comment: "Agreed", holds: true },
    ]);
    expect(verifyHistory(bench.db.reader.sqlite).findings).toEqual([]);
  });

  it("show each row beside what was in force before it", () => {
    const { bench, ines, row, propose, decide } = begin();
    decide(propose([row(constant({ toleranceHigh: 14 }))]));
    const id = propose([row(constant({ toleranceHigh: 15 }))]);
    const [changed] = bench.ask(ines, getLimitWorkbook, { workbookId: id }).rows;
    expect(changed).toMatchObject({
      shape: { bounds: { toleranceHigh: 15 } },
      before: { version: 1, shape: { bounds: { toleranceHigh: 14 } } },
    });
  });

  it("are refused out of order, with the names of both limits and the place, and nothing is kept", () => {
    const { bench, row, propose } = begin();
    const refused = refusal(() =>
      propose([row(constant({ toleranceHigh: 20 })), row(constant({ watchHigh: 15, toleranceHigh: 14 }))]),
    );
    expect(refused.code).toBe("invalid");
    expect(refused.errors).toHaveLength(1);
    expect(refused.errors[0]?.pointer).toBe("/rows/1/shape");
    expect(refused.errors[0]?.detail).toContain("upper watch limit");
    expect(refused.errors[0]?.detail).toContain("upper tolerance limit");
    expect(refused.errors[0]?.detail).toContain("KELP-01");
    expect(bench.db.reader.orm.select().from(limitVersion).all()).toEqual([]);
  });

  it("are refused where they would end before they begin, and without a reason", () => {
    const { bench, noor, row, propose } = begin();
    const shape = constant({ toleranceHigh: 14 });
    const refused = refusal(() => propose([row(shape, { effectiveToAt: NOON })]));
    expect(refused.errors[0]?.pointer).toBe("/rows/0/effectiveToAt");
    const silent = { title: "Cooler kelp", reason: "", rows: [row(shape)] };
    expect(refusal(() => bench.run(noor, proposeLimits, silent)).errors[0]?.pointer).toBe("/reason");
  });

  it("end at their moment, and the version before holds again", () => {
    const { row, propose, decide, inForce } = begin();
    decide(propose([row(constant({ toleranceHigh: 14 }))]));
    const span = { effectiveFromAt: NOON + DAY_MS, effectiveToAt: NOON + 3 * DAY_MS };
    decide(propose([row(constant({ toleranceHigh: 18 }), span)]));
    const highAt = (at: number) => inForce(at);
    expect(highAt(NOON + DAY_MS - 1)).toMatchObject({ version: 1 });
    expect(highAt(NOON + DAY_MS)).toMatchObject({ version: 2 });
    expect(highAt(NOON + 3 * DAY_MS)).toMatchObject({ version: 1 });
  });
});

describe("approved limits", () => {
  it("judge the readings taken since again, and the old judgement stays", async () => {
    const { bench, row, propose, decide, settle, take, statusOf } = begin();
    bench.clock.set(NOON + 6 * HOUR_MS);
    const before = take("15", NOON - HOUR_MS);
    const after = take("15", NOON + HOUR_MS);
    expect([before?.status, after?.status]).toEqual(["none", "none"]);
    decide(propose([row(constant({ toleranceHigh: 14 }))]));
    await settle();
    expect(statusOf(before?.readingId)?.status).toBe("none");
    expect(statusOf(after?.readingId)?.status).toBe("out");
    const judged = bench.db.reader.orm
      .select()
      .from(judgement)
      .where(eq(judgement.readingId, after?.readingId ?? 0))
      .all();
    expect(judged.map(({ status, cause }) => [status, cause])).toEqual([
      ["none", "entered"],
      ["out", "new-limits"],
    ]);
  });

  it("that are declined judge nothing again", async () => {
    const { bench, ines, row, propose, decide, settle, take, statusOf } = begin();
    bench.clock.set(NOON + 6 * HOUR_MS);
    const reading = take("15", NOON + HOUR_MS);
    decide(propose([row(constant({ toleranceHigh: 14 }))]), ines, "decline", "Too narrow");
    await settle();
    expect(statusOf(reading?.readingId)?.status).toBe("none");
  });

  it("that are suspended leave readings without limits, and say why", async () => {
    const { bench, row, propose, decide, settle, take, statusOf, inForce } = begin();
    bench.clock.set(NOON + 6 * HOUR_MS);
    decide(propose([row(constant({ toleranceHigh: 14 }))]));
    const reading = take("15", NOON + HOUR_MS);
    expect(reading?.status).toBe("out");
    decide(propose([row(constant({}), { suspendedReason: "No animals until the glass is mended" })]));
    await settle();
    expect(inForce(NOON + HOUR_MS)).toMatchObject({
      state: "suspended",
      reason: "No animals until the glass is mended",
    });
    expect(statusOf(reading?.readingId)?.status).toBe("none");
    expect(statusOf(reading?.readingId)?.sentence).toContain("No animals until the glass is mended");
  });

  it("rise from 12 to 16 °C over 92 days, and stand at 14 °C on day 46", () => {
    const { row, propose, decide, inForce } = begin();
    const knot = (day: number, target: number) => ({
      at: NOON + day * DAY_MS,
      bounds: { target, toleranceHigh: target + 2 },
    });
    decide(propose([row({ kind: "ramp", knots: [knot(0, 12), knot(92, 16)] })]));
    // A straight line: 12 + 4 × 46/92 = 14
    const at = (day: number) => inForce(NOON + day * DAY_MS);
    expect(at(46)).toMatchObject({ bounds: { target: 14, toleranceHigh: 16 } });
    expect(at(0)).toMatchObject({ bounds: { target: 12 } });
    expect(at(92)).toMatchObject({ bounds: { target: 16 } });
    expect(at(120)).toMatchObject({ bounds: { target: 16, toleranceHigh: 18 } });
  });
});

describe("a template of limits", () => {
  it("is laid on many systems as one workbook and approved in one act", () => {
    const { bench, water, ines, noor, propose, row, decide, inForce } = begin();
    const others = ["REEF", "SEAL", "LARV"].map((code) => waterFor(bench, code));
    const shape = constant({ target: 12, toleranceLow: 10, toleranceHigh: 14 });
    bench.run(ines, saveLimitTemplate, {
      name: "Cold water",
      rows: [
        { parameterId: water.temperatureId, shape },
        { parameterId: water.ammoniaId, shape: constant({ toleranceHigh: 0.1 }) },
      ],
    });
    const [template] = bench.ask(noor, listLimitTemplates, {});
    const points = [water, ...others].map((each) => each.pointId);
    const rows = points.flatMap((pointId) =>
      (template?.rows ?? []).map((each) => ({
        ...row(each.shape as LimitShape),
        pointId,
        parameterId: each.parameterId,
      })),
    );
    expect(rows).toHaveLength(8);
    decide(propose(rows));
    for (const pointId of points) {
      expect(inForce(NOON, water.temperatureId, pointId)).toMatchObject({
        bounds: { target: 12, toleranceHigh: 14 },
      });
      expect(inForce(NOON, water.ammoniaId, pointId)).toMatchObject({ bounds: { toleranceHigh: 0.1 } });
    }
  });

  it("is refused out of order or under a taken name, and changed under its own", () => {
    const { bench, water, ines } = begin();
    const save = (name: string, bounds: object, templateId?: number) =>
      bench.run(ines, saveLimitTemplate, {
        templateId,
        name,
        rows: [{ parameterId: water.temperatureId, shape: constant(bounds) }],
      });
    const { templateId } = save("Cold water", { target: 12 });
    expect(refusal(() => save("cold WATER", { target: 11 })).errors[0]?.pointer).toBe("/name");
    expect(refusal(() => save("Other", { toleranceLow: 15, toleranceHigh: 10 })).errors[0]?.pointer).toBe(
      "/rows/0/shape",
    );
    save("Cold water", { target: 11 }, templateId);
    expect(bench.ask(ines, listLimitTemplates, {})).toMatchObject([
      { rows: [{ shape: { bounds: { target: 11 } } }] },
    ]);
  });
});

describe("the board of limits", () => {
  it("shows what is in force with every version behind it, newest first, and only the person's own areas", () => {
    const { bench, water, ines, row, propose, decide } = begin();
    const other = waterFor(bench, "REEF");
    bench.run(ines, planWatch, {
      pointId: water.pointId,
      items: [{ parameterId: water.ammoniaId, everyDays: 1 }],
    });
    decide(propose([row(constant({ toleranceHigh: 14 }))]));
    propose([
      row(constant({ toleranceHigh: 15 })),
      { ...row(constant({ toleranceHigh: 26 })), pointId: other.pointId },
    ]);
    const board = bench.ask(ines, listLimitBoard, { systemId: water.systemId });
    expect(board.map((each) => [each.parameterId, each.limits.state])).toEqual([
      [water.ammoniaId, "none"],
      [water.temperatureId, "in-force"],
    ]);
    expect(board[1]?.versions.map(({ version, state }) => [version, state])).toEqual([
      [2, "proposed"],
      [1, "approved"],
    ]);
    const keeper = bench.person("Joe Okafor", ["aquarist"], [other.areaId]);
    expect(bench.ask(keeper, listLimitBoard, {}).map((each) => each.systemCode)).toEqual(["REEF-01"]);
  });
});
