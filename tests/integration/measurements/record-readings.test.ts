import { desc, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { HOUR_MS } from "@/lib/clock";
import { SYSTEM_ACTOR } from "@/modules/access";
import { JobRunner, runCommand, verifyHistory } from "@/modules/audit";
import {
  confirmReading,
  correctReading,
  growDelivery,
  judgeSeriesAgain,
  openDelivery,
  publishDelivery,
  recordReadings,
  voidReading,
  withdrawDelivery,
} from "@/modules/measurements";
import { judgement, readingInForce } from "@/modules/measurements/schema";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

function begin() {
  const bench = testBench(NOON + 24 * HOUR_MS);
  const water = waterFor(bench);
  const joe = bench.person("Joe Okafor", ["aquarist"], [water.areaId]);
  const take = (parameterId: number, text: string, at: number, more: Record<string, unknown> = {}) =>
    bench.run(joe, recordReadings, { readings: [water.reading(parameterId, text, at, more)] }).readings[0];
  const statusOf = (readingId: number | undefined) =>
    bench.db.reader.orm
      .select()
      .from(readingInForce)
      .where(eq(readingInForce.id, readingId ?? 0))
      .get()?.status;
  return { bench, water, joe, take, statusOf };
}

describe("a reading", () => {
  it("of 64.4 °F is within a limit of at most 18 °C", () => {
    const { water, take } = begin();
    water.limit(water.temperatureId, { kind: "constant", bounds: { toleranceHigh: 18 } });
    expect(take(water.temperatureId, "64.4", NOON, { typedUnit: "°F" })?.status).toBe("within");
    expect(take(water.temperatureId, "64,5", NOON, { typedUnit: "°F" })?.status).toBe("out");
  });

  it("is out when it has changed by more than allowed against any reading of the preceding 24 h", () => {
    const { water, take, statusOf } = begin();
    water.limit(water.temperatureId, { kind: "constant", bounds: { greatestChange24h: 1.0 } });
    take(water.temperatureId, "24.0", NOON);
    expect(take(water.temperatureId, "24.6", NOON + 6 * HOUR_MS)?.status).toBe("within");
    const last = take(water.temperatureId, "25.2", NOON + 12 * HOUR_MS);
    expect(last?.status).toBe("out");
    expect(statusOf(last?.readingId)).toBe("out");
  });

  it("is out by its change also when the value in between comes last", () => {
    const { bench, water, take, statusOf } = begin();
    water.limit(water.temperatureId, { kind: "constant", bounds: { greatestChange24h: 1.0 } });
    const six = take(water.temperatureId, "24.0", NOON);
    const eighteen = take(water.temperatureId, "25.2", NOON + 12 * HOUR_MS);
    const twelve = take(water.temperatureId, "24.6", NOON + 6 * HOUR_MS);
    expect([six, twelve, eighteen].map((each) => statusOf(each?.readingId))).toEqual([
      "within",
      "within",
      "out",
    ]);
    expect(
      bench.db.reader.orm
        .select()
        .from(judgement)
        .where(eq(judgement.readingId, eighteen?.readingId ?? 0))
        .all().length,
    ).toBeGreaterThan(0);
  });

  it("that comes late judges again what came after it, and the old judgement stays", () => {
    const { bench, water, take, statusOf } = begin();
    water.limit(water.temperatureId, { kind: "constant", bounds: { greatestChange24h: 1.0 } });
    const later = take(water.temperatureId, "25.2", NOON + 6 * HOUR_MS);
    expect(statusOf(later?.readingId)).toBe("within");
    take(water.temperatureId, "24.0", NOON);
    expect(statusOf(later?.readingId)).toBe("out");
    const all = bench.db.reader.orm
      .select()
      .from(judgement)
      .where(eq(judgement.readingId, later?.readingId ?? 0))
      .orderBy(desc(judgement.id))
      .all();
    expect(all.map((each) => [each.status, each.cause])).toEqual([
      ["out", "late-reading"],
      ["within", "entered"],
    ]);
  });

  it("below a detection limit that lies above the tolerance limit cannot be judged", () => {
    const { water, take } = begin();
    water.limit(water.ammoniaId, { kind: "constant", bounds: { toleranceHigh: 0.0075 } });
    expect(take(water.ammoniaId, "<0.05", NOON)?.status).toBe("unjudged");
    expect(take(water.ammoniaId, "<0.005", NOON)?.status).toBe("within");
  });

  it("is stored whatever its status, and asks to be confirmed when it is off", () => {
    const { bench, water, joe, take } = begin();
    water.limit(water.temperatureId, { kind: "constant", bounds: { toleranceHigh: 18 } });
    const answer = take(water.temperatureId, "81.2", NOON);
    expect(answer).toMatchObject({ status: "implausible", mustBeConfirmed: true });
    bench.run(joe, confirmReading, { readingId: answer?.readingId ?? 0 });
    expect(() => bench.run(joe, confirmReading, { readingId: answer?.readingId ?? 0 })).toThrow(
      "confirmed already",
    );
  });

  it("sent twice is one, and a UUID cannot stand for another value", () => {
    const { bench, water, joe } = begin();
    const sent = water.reading(water.temperatureId, "13.4", NOON);
    bench.run(joe, recordReadings, { readings: [sent] });
    expect(bench.run(joe, recordReadings, { readings: [sent] }).readings[0]?.isRepeat).toBe(true);
    expect(bench.db.reader.orm.select().from(readingInForce).all()).toHaveLength(1);
    expect(() => bench.run(joe, recordReadings, { readings: [{ ...sent, typedText: "13.5" }] })).toThrow(
      "another reading",
    );
  });

  it("is kept as typed beside its canonical value", () => {
    const { bench, water, take } = begin();
    take(water.temperatureId, "64,4", NOON, { typedUnit: "deg F" });
    const row = bench.db.reader.orm.select().from(readingInForce).get();
    expect(row).toMatchObject({ typedText: "64,4", typedUnit: "deg F" });
    expect(row?.value).toBeCloseTo(18, 9);
  });

  it.each([
    ["1,234", "/readings/0/typedText"],
    ["warm", "/readings/0/typedText"],
    ["", "/readings/0/typedText"],
  ])("written %j is refused with a sentence at its place and stores nothing", (typedText, pointer) => {
    const { bench, water, joe } = begin();
    try {
      bench.run(joe, recordReadings, { readings: [water.reading(water.temperatureId, typedText, NOON)] });
      expect.unreachable();
    } catch (cause) {
      expect((cause as { errors: { pointer: string; detail: string }[] }).errors[0]?.pointer).toBe(pointer);
    }
    expect(bench.db.reader.orm.select().from(readingInForce).all()).toHaveLength(0);
  });

  it.each([
    [
      "in the future",
      (water: ReturnType<typeof waterFor>) => water.reading(water.temperatureId, "13", NOON + 48 * HOUR_MS),
      "future",
    ],
    [
      "in a unit that does not fit",
      (water: ReturnType<typeof waterFor>) =>
        water.reading(water.temperatureId, "13", NOON, { typedUnit: "mg/L" }),
      "not accepted",
    ],
    [
      "taken by nobody we know",
      (water: ReturnType<typeof waterFor>) =>
        water.reading(water.temperatureId, "13", NOON, { takenBy: 999 }),
      "no such person",
    ],
  ])("%s is refused", (_what, make, sentence) => {
    const { bench, water, joe } = begin();
    expect(() => bench.run(joe, recordReadings, { readings: [make(water)] })).toThrow(sentence);
  });

  it("of another area than one's own is refused, also when it hides among one's own", () => {
    const { bench, water, joe } = begin();
    const other = waterFor(bench, "REEF");
    const readings = [
      water.reading(water.temperatureId, "13", NOON),
      other.reading(other.temperatureId, "25", NOON),
    ];
    expect(() => bench.run(joe, recordReadings, { readings })).toThrow("areas you are assigned to");
    expect(bench.db.reader.orm.select().from(readingInForce).all()).toHaveLength(0);
  });
});

describe("a correction", () => {
  it("keeps the original, counts in its place and judges again what depended on it", () => {
    const { bench, water, joe, take, statusOf } = begin();
    water.limit(water.temperatureId, { kind: "constant", bounds: { greatestChange24h: 1.0 } });
    const first = take(water.temperatureId, "20.0", NOON);
    const second = take(water.temperatureId, "24.0", NOON + HOUR_MS);
    expect(statusOf(second?.readingId)).toBe("out");
    const corrected = bench.run(joe, correctReading, {
      readingId: first?.readingId ?? 0,
      uuid: crypto.randomUUID(),
      typedText: "24.0",
      reason: "misread the display",
    });
    expect(statusOf(second?.readingId)).toBe("within");
    expect(statusOf(first?.readingId)).toBeUndefined();
    expect(statusOf(corrected.readingId)).toBe("within");
    const kept = bench.db.reader.sqlite
      .prepare("select typed_text from measurements_reading where id = ?")
      .get(first?.readingId);
    expect(kept).toEqual({ typed_text: "20.0" });
    expect(() =>
      bench.run(joe, correctReading, {
        readingId: first?.readingId ?? 0,
        uuid: crypto.randomUUID(),
        typedText: "1",
        reason: "again",
      }),
    ).toThrow("has been corrected");
  });

  it("without a reason is refused", () => {
    const { bench, water, joe, take } = begin();
    const first = take(water.temperatureId, "20.0", NOON);
    const input = {
      readingId: first?.readingId ?? 0,
      uuid: crypto.randomUUID(),
      typedText: "21",
      reason: " ",
    };
    expect(() => bench.run(joe, correctReading, input)).toThrow("must be mended");
  });

  it("of a struck-out reading is refused, and a struck-out reading counts no more", () => {
    const { bench, water, joe, take, statusOf } = begin();
    const first = take(water.temperatureId, "20.0", NOON);
    bench.run(joe, voidReading, { readingId: first?.readingId ?? 0, reason: "wrong system" });
    expect(statusOf(first?.readingId)).toBeUndefined();
    const input = {
      readingId: first?.readingId ?? 0,
      uuid: crypto.randomUUID(),
      typedText: "21",
      reason: "typo",
    };
    expect(() => bench.run(joe, correctReading, input)).toThrow("struck out");
  });
});

describe("a delivery of readings", () => {
  it("is seen at one moment, judges its neighbours again, and withdrawn leaves no reading in force", async () => {
    const { bench, water, take, statusOf } = begin();
    const ana = bench.person("Ana Reyes", ["analyst"]);
    water.limit(water.temperatureId, { kind: "constant", bounds: { greatestChange24h: 1.0 } });
    const neighbour = take(water.temperatureId, "25.2", NOON + 6 * HOUR_MS);
    const { deliveryId } = bench.run(ana, openDelivery, { sourceRef: "import:1" });
    const readings = [
      water.reading(water.temperatureId, "24.0", NOON),
      water.reading(water.temperatureId, "24.1", NOON + HOUR_MS),
    ];
    bench.run(ana, growDelivery, { deliveryId, readings });
    const seen = () => bench.db.reader.orm.select().from(readingInForce).all().length;
    expect(seen()).toBe(1);
    bench.run(ana, publishDelivery, { deliveryId });
    expect(seen()).toBe(3);
    const runner = new JobRunner(bench.db, bench.clock, [judgeSeriesAgain]);
    await runner.drain();
    expect(statusOf(neighbour?.readingId)).toBe("out");
    bench.run(ana, withdrawDelivery, { deliveryId, reason: "wrong instrument file" });
    expect(seen()).toBe(1);
    await runner.drain();
    expect(statusOf(neighbour?.readingId)).toBe("within");
    expect(verifyHistory(bench.db.reader.sqlite).findings).toEqual([]);
  });

  it("once published takes no more", () => {
    const { bench, water } = begin();
    const ana = bench.person("Ana Reyes", ["analyst"]);
    const { deliveryId } = bench.run(ana, openDelivery, { sourceRef: "import:1" });
    bench.run(ana, publishDelivery, { deliveryId });
    const readings = [water.reading(water.temperatureId, "24.0", NOON)];
    expect(() => bench.run(ana, growDelivery, { deliveryId, readings })).toThrow("have been published");
  });

  it("cannot be judged again by a person", () => {
    const { bench, water, joe } = begin();
    const input = {
      pointId: water.pointId,
      parameterId: water.temperatureId,
      fromAt: 0,
      toAt: null,
      cause: "new-limits" as const,
    };
    expect(() => runCommand(bench.db, joe, judgeSeriesAgain, input, { clock: bench.clock })).toThrow(
      "does not allow",
    );
    expect(
      runCommand(bench.db, SYSTEM_ACTOR, judgeSeriesAgain, input, { clock: bench.clock }).result,
    ).toEqual({ judged: 0 });
  });
});
