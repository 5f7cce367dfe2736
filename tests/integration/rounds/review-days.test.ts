import { describe, expect, it } from "vitest";
import { HOUR_MS } from "@/lib/clock";
import { verifyHistory } from "@/modules/audit";
import { confirmReading, correctReading, recordReadings } from "@/modules/measurements";
import { getDaySheet, reviewDays } from "@/modules/rounds";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

const DAY = "2026-03-02";

function begin() {
  const bench = testBench(NOON + 4 * HOUR_MS);
  const water = waterFor(bench);
  water.limit(water.temperatureId, { kind: "constant", bounds: { toleranceHigh: 18 } });
  const joe = bench.person("Joe Okafor", ["aquarist"]);
  const ines = bench.person("Ines Marlow", ["lead"]);
  const read = (who: typeof joe, text: string, at = NOON, confirmed = false) =>
    bench.run(who, recordReadings, {
      readings: [water.reading(water.temperatureId, text, at, { confirmed })],
    }).readings[0]?.readingId ?? 0;
  const shown = (who = ines, onDay = DAY) => bench.ask(who, getDaySheet, { areaId: water.areaId, onDay });
  const review = (
    who: typeof joe,
    outcome: "reviewed" | "returned" = "reviewed",
    comment = "",
    hash = shown().sheet.contentHash,
  ) =>
    bench.run(who, reviewDays, {
      outcome,
      comment,
      sheets: [{ areaId: water.areaId, onDay: DAY, contentHash: hash }],
    });
  return { bench, water, joe, ines, read, shown, review };
}

describe("a day sheet", () => {
  it("is signed by a lead, and the signature holds while nothing changes", () => {
    const { bench, ines, joe, read, review, shown } = begin();
    read(joe, "13.4");
    review(ines);
    expect(shown()).toMatchObject({ state: "reviewed", counts: { readings: 1 } });
    expect(shown().signatures[0]).toMatchObject({
      printedName: "Ines Marlow",
      meaning: "reviewed",
      holds: true,
    });
    expect(verifyHistory(bench.db.reader.sqlite).findings).toEqual([]);
  });

  it("shows a signature broken after a correction and waits for review again", () => {
    const { bench, ines, joe, read, review, shown } = begin();
    const readingId = read(joe, "13.4");
    review(ines);
    bench.run(joe, correctReading, {
      readingId,
      uuid: crypto.randomUUID(),
      typedText: "13.9",
      reason: "misread",
    });
    expect(shown().state).toBe("changed");
    expect(shown().signatures[0]?.holds).toBe(false);
    review(ines);
    expect(shown().state).toBe("reviewed");
    expect(shown().signatures.map((each) => each.holds)).toEqual([false, true]);
  });

  it("is not reviewed by whoever took a reading on it, whatever roles they hold", () => {
    const { bench, read, review, shown } = begin();
    const both = bench.person("Tam Brandt", ["aquarist", "lead"]);
    read(both, "13.4");
    expect(() => review(both)).toThrow("another lead");
    expect(shown(both).hindrances[0]).toContain("another lead");
    expect(shown().state).toBe("waiting");
  });

  it("is not reviewed while something that is off is neither confirmed nor measured again", () => {
    const { bench, ines, joe, read, review } = begin();
    const readingId = read(joe, "19.1");
    expect(() => review(ines)).toThrow("neither confirmed nor measured again");
    bench.run(joe, confirmReading, { readingId });
    expect(review(ines)).toEqual({ sheets: 1, outcome: "reviewed" });
  });

  it("that changed since it was opened is not signed", () => {
    const { ines, joe, read, review, shown } = begin();
    read(joe, "13.4");
    const { contentHash } = shown().sheet;
    read(joe, "13.5", NOON + HOUR_MS);
    expect(() => review(ines, "reviewed", "", contentHash)).toThrow("has changed since you opened it");
  });

  it("is returned with a comment only, and waits again once something was done", () => {
    const { ines, joe, read, review, shown } = begin();
    read(joe, "13.4");
    expect(() => review(ines, "returned")).toThrow("Say what is to be done");
    review(ines, "returned", "Oxygen is missing");
    expect(shown().state).toBe("returned");
    read(joe, "13.5", NOON + HOUR_MS);
    expect(shown().state).toBe("waiting");
  });

  it("is not signed without the password, nor by another role, nor twice", () => {
    const { bench, water, ines, joe, read, review, shown } = begin();
    read(joe, "13.4");
    const sheets = [{ areaId: water.areaId, onDay: DAY, contentHash: shown().sheet.contentHash }];
    const input = { outcome: "reviewed" as const, comment: "", sheets };
    expect(() => bench.run(ines, reviewDays, input, { passwordConfirmed: false })).toThrow(
      "asks for your password",
    );
    expect(() => bench.run(joe, reviewDays, input)).toThrow("does not allow");
    review(ines);
    expect(() => review(ines)).toThrow("reviewed already");
  });

  it("of the night belongs to the day on which it began", () => {
    const { bench, joe, read, ines } = begin();
    bench.clock.set(Date.UTC(2026, 2, 3, 9));
    read(joe, "13.4", Date.UTC(2026, 2, 3, 1, 30));
    const sheet = (onDay: string) => bench.ask(ines, getDaySheet, { areaId: 1, onDay }).sheet.lines.length;
    expect([sheet("2026-03-02"), sheet("2026-03-03")]).toEqual([1, 0]);
  });

  it("of another area is not shown to somebody who is bound to areas", () => {
    const { bench, water } = begin();
    const bound = bench.person("Bo Lind", ["aquarist"], [water.areaId + 100]);
    expect(() => bench.ask(bound, getDaySheet, { areaId: water.areaId, onDay: DAY })).toThrow("may not see");
  });
});
