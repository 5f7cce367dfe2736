import { describe, expect, it } from "vitest";
import { HOUR_MS, MINUTE_MS } from "@/lib/clock";
import { Problem } from "@/lib/problem";
import type { Actor } from "@/modules/access";
import { verifyHistory } from "@/modules/audit";
import { correctReading, recordReadings } from "@/modules/measurements";
import {
  addIncidentNote,
  closeIncident,
  findOpenIncident,
  getIncident,
  incidentOfReading,
  joinReading,
  listIncidents,
  openIncident,
  recordRecheck,
  setOwner,
  setRecheck,
} from "@/modules/quality";
import { getDaySheet } from "@/modules/rounds";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

const CLOSURE = "Chiller valve stuck; freed and watched for a night.";

function begin() {
  const bench = testBench(NOON + 8 * HOUR_MS);
  const water = waterFor(bench);
  water.limit(water.temperatureId, { kind: "constant", bounds: { toleranceHigh: 18 } });
  const joe = bench.person("Joe Okafor", ["aquarist"], [water.areaId]);
  const ines = bench.person("Ines Marlow", ["lead"]);
  const read = (text: string, at: number, who: Actor = joe, parameterId = water.temperatureId) =>
    bench.run(who, recordReadings, { readings: [water.reading(parameterId, text, at, { confirmed: true })] })
      .readings[0]?.readingId ?? 0;
  const open = (readingId: number, who: Actor = joe) =>
    bench.run(who, openIncident, { readingId, title: "Too warm", note: "Chiller is silent" });
  const shown = (incidentId: number, who: Actor = ines) => bench.ask(who, getIncident, { incidentId });
  const sheet = () => bench.ask(ines, getDaySheet, { areaId: water.areaId, onDay: "2026-03-02" });
  const entries = () =>
    (bench.db.reader.sqlite.prepare("select count(*) as n from audit_entry").get() as { n: number }).n;
  return { bench, water, joe, ines, read, open, shown, sheet, entries };
}

/** The code of the refusal that an act meets. */
function refusal(act: () => unknown): string {
  try {
    act();
  } catch (cause) {
    if (cause instanceof Problem) return cause.code;
    throw cause;
  }
  return "no refusal";
}

describe("an incident", () => {
  it("opened from a reading that is off carries it, numbers itself by the year, and explains it on the day sheet", () => {
    const { bench, ines, open, read, sheet, shown } = begin();
    const readingId = read("19.1", NOON);
    expect(sheet().counts.unexplained).toBe(1);
    const { incidentId, code } = open(readingId);
    expect(code).toBe("26-0001");
    expect(sheet().counts.unexplained).toBe(0);
    expect(sheet().sheet.lines[0]?.explanations[0]?.text).toBe("incident 26-0001: Too warm");
    expect(shown(incidentId)).toMatchObject({
      incident: { state: "open", systemCode: "KELP-01", readings: 1 },
      readings: [{ readingId, status: "out", standing: "in force" }],
      notes: [{ text: "Chiller is silent" }],
    });
    expect(bench.ask(ines, listIncidents, {}).map((row) => row.code)).toEqual(["26-0001"]);
    expect(verifyHistory(bench.db.reader.sqlite).findings).toEqual([]);
  });

  it("is not opened from a reading that is within, and nothing is written", () => {
    const { entries, open, read } = begin();
    const readingId = read("13.4", NOON);
    const before = entries();
    expect(() => open(readingId)).toThrow("is not out of tolerance (within)");
    expect(entries()).toBe(before);
  });

  it("is one for each point and parameter: a second is refused and names the first", () => {
    const { open, read } = begin();
    open(read("19.1", NOON));
    expect(() => open(read("19.2", NOON + HOUR_MS))).toThrow("Incident 26-0001 is about this already");
  });

  it("takes later readings of the same trouble, each once, and explains them", () => {
    const { bench, joe, open, read, sheet, shown } = begin();
    const { incidentId } = open(read("19.1", NOON));
    const later = read("19.4", NOON + HOUR_MS);
    bench.run(joe, joinReading, { incidentId, readingId: later });
    expect(shown(incidentId).readings).toHaveLength(2);
    expect(sheet().counts.unexplained).toBe(0);
    expect(() => bench.run(joe, joinReading, { incidentId, readingId: later })).toThrow("26-0001 already");
  });

  it("takes no reading of another parameter, nor one that is within, nor one that has been corrected", () => {
    const { bench, joe, open, read, water } = begin();
    const { incidentId } = open(read("19.1", NOON));
    water.limit(water.ammoniaId, { kind: "constant", bounds: { toleranceHigh: 0.02 } });
    const ammonia = read("0.05", NOON, joe, water.ammoniaId);
    const fine = read("14.0", NOON + HOUR_MS);
    const old = read("20.0", NOON + 2 * HOUR_MS);
    bench.run(joe, correctReading, {
      readingId: old,
      uuid: crypto.randomUUID(),
      typedText: "19.0",
      reason: "misread",
    });
    const join = (readingId: number) => () => bench.run(joe, joinReading, { incidentId, readingId });
    expect(join(ammonia)).toThrow("another point or parameter");
    expect(join(fine)).toThrow("Record it as the recheck");
    expect(join(old)).toThrow("has been corrected");
  });

  it("opened by hand for a system needs no reading; its point must belong to the system", () => {
    const { bench, joe, water } = begin();
    const other = waterFor(bench, "REEF");
    const byHand = { systemId: water.systemId, title: "Pump is noisy" };
    expect(bench.run(joe, openIncident, byHand).code).toBe("26-0001");
    const wrong = { ...byHand, pointId: other.pointId, parameterId: water.temperatureId };
    expect(() => bench.run(joe, openIncident, wrong)).toThrow("belongs to another system");
    expect(refusal(() => bench.run(joe, openIncident, { title: "Nowhere" }))).toBe("invalid");
  });

  it("is found by its point and parameter until it is closed", () => {
    const { bench, ines, joe, open, read, water } = begin();
    const key = { pointId: water.pointId, parameterId: water.temperatureId };
    expect(bench.ask(joe, findOpenIncident, key)).toBeNull();
    const { incidentId } = open(read("19.1", NOON));
    expect(bench.ask(joe, findOpenIncident, key)?.id).toBe(incidentId);
    read("14.0", NOON + HOUR_MS);
    bench.run(ines, closeIncident, { incidentId, closureText: CLOSURE });
    expect(bench.ask(joe, findOpenIncident, key)).toBeNull();
  });

  it("is told of beside a reading: the one it belongs to, or the open one about the same trouble", () => {
    const { bench, joe, open, read } = begin();
    const [first, later] = [read("19.1", NOON), read("19.4", NOON + HOUR_MS)];
    const of = (readingId: number, who: Actor = joe) => bench.ask(who, incidentOfReading, { readingId });
    expect(of(first)).toMatchObject({ joined: null, open: null });
    const { incidentId } = open(first);
    expect(of(first)).toMatchObject({ joined: { id: incidentId }, open: null });
    expect(of(later)).toMatchObject({ joined: null, open: { id: incidentId } });
    const bo = bench.person("Bo Lind", ["aquarist"], [waterFor(bench, "REEF").areaId]);
    expect(refusal(() => of(first, bo))).toBe("not-found");
  });
});

describe("a recheck", () => {
  it("within makes the incident wait for a lead; one that is off joins and keeps it open", () => {
    const { bench, joe, open, read, shown } = begin();
    const { incidentId } = open(read("19.1", NOON));
    bench.run(joe, setRecheck, { incidentId, recheckDueAt: NOON + 9 * HOUR_MS });
    const warm = read("18.6", NOON + HOUR_MS);
    expect(bench.run(joe, recordRecheck, { incidentId, readingId: warm })).toMatchObject({ state: "open" });
    expect(shown(incidentId)).toMatchObject({ incident: { state: "open", readings: 2 } });
    const cool = read("14.2", NOON + 2 * HOUR_MS);
    expect(bench.run(joe, recordRecheck, { incidentId, readingId: cool })).toMatchObject({
      state: "rechecked",
    });
    expect(shown(incidentId)).toMatchObject({
      incident: { state: "rechecked", recheckDueAt: null },
      recheck: { id: cool, status: "within" },
    });
  });

  it("is taken after the trouble began, at the same point, of the same parameter", () => {
    const { bench, joe, open, read, water } = begin();
    const early = read("14.0", NOON - HOUR_MS);
    const ammonia = read("0.01", NOON + HOUR_MS, joe, water.ammoniaId);
    const { incidentId } = open(read("19.1", NOON));
    const recheck = (readingId: number) => () => bench.run(joe, recordRecheck, { incidentId, readingId });
    expect(recheck(early)).toThrow("taken after the trouble began");
    expect(recheck(ammonia)).toThrow("another point or parameter");
    expect(recheck(9999)).toThrow("such reading");
  });

  it("is due in the future only, and asking for one more opens a rechecked incident again", () => {
    const { bench, joe, open, read, shown } = begin();
    const { incidentId } = open(read("19.1", NOON));
    bench.run(joe, recordRecheck, { incidentId, readingId: read("14.2", NOON + HOUR_MS) });
    expect(() => bench.run(joe, setRecheck, { incidentId, recheckDueAt: NOON })).toThrow("must lie ahead");
    bench.run(joe, setRecheck, { incidentId, recheckDueAt: NOON + 20 * HOUR_MS });
    expect(shown(incidentId).incident.state).toBe("open");
  });

  it("that is followed by a reading that is off again leaves the incident open", () => {
    const { bench, joe, open, read, shown } = begin();
    const { incidentId } = open(read("19.1", NOON));
    bench.run(joe, recordRecheck, { incidentId, readingId: read("14.2", NOON + HOUR_MS) });
    bench.run(joe, joinReading, { incidentId, readingId: read("19.5", NOON + 2 * HOUR_MS) });
    expect(shown(incidentId).incident.state).toBe("open");
  });
});

describe("closing an incident", () => {
  it("is a lead's, with a text; afterwards nothing more is written on it", () => {
    const { bench, ines, joe, open, read, shown } = begin();
    const { incidentId } = open(read("19.1", NOON));
    read("14.0", NOON + HOUR_MS);
    expect(refusal(() => bench.run(joe, closeIncident, { incidentId, closureText: CLOSURE }))).toBe(
      "not-allowed",
    );
    expect(refusal(() => bench.run(ines, closeIncident, { incidentId, closureText: "ok" }))).toBe("invalid");
    bench.run(ines, closeIncident, { incidentId, closureText: CLOSURE });
    expect(shown(incidentId)).toMatchObject({ incident: { state: "closed" }, closure: { text: CLOSURE } });
    expect(() => bench.run(joe, addIncidentNote, { incidentId, text: "one more thing" })).toThrow(
      "is closed",
    );
    expect(() => bench.run(ines, closeIncident, { incidentId, closureText: CLOSURE })).toThrow("is closed");
  });

  it("is refused while the newest reading is off, unless the lead says why; the reason is kept", () => {
    const { bench, ines, open, read, shown } = begin();
    const { incidentId } = open(read("19.1", NOON));
    expect(() => bench.run(ines, closeIncident, { incidentId, closureText: CLOSURE })).toThrow(
      "still out of tolerance",
    );
    const stillOffReason = "The tank is drained for works until April.";
    bench.run(ines, closeIncident, { incidentId, closureText: CLOSURE, stillOffReason });
    expect(shown(incidentId).closure?.stillOffReason).toBe(stillOffReason);
  });

  it("is refused to a lead who alone has acted on it, until another person has", () => {
    const { bench, ines, joe, open, read, shown } = begin();
    const { incidentId } = open(read("19.1", NOON, ines), ines);
    read("14.0", NOON + HOUR_MS, ines);
    const close = () => bench.run(ines, closeIncident, { incidentId, closureText: CLOSURE });
    expect(shown(incidentId).onlyYouActed).toBe(true);
    expect(refusal(close)).toBe("own-work");
    bench.run(joe, addIncidentNote, { incidentId, text: "Felt the pipe: it is cold again." });
    expect(refusal(close)).toBe("no refusal");
  });
});

describe("who may work on incidents", () => {
  it("a reader and an auditor see them and change nothing", () => {
    const { bench, open, read, entries } = begin();
    const { incidentId } = open(read("19.1", NOON));
    for (const role of ["reader", "auditor"] as const) {
      const person = bench.person(`Rita ${role}`, [role]);
      expect(bench.ask(person, listIncidents, {})).toHaveLength(1);
      const before = entries();
      expect(refusal(() => bench.run(person, addIncidentNote, { incidentId, text: "hello there" }))).toBe(
        "not-allowed",
      );
      expect(entries()).toBe(before);
    }
  });

  it("an aquarist of another area neither sees nor touches them", () => {
    const { bench, open, read } = begin();
    const { incidentId } = open(read("19.1", NOON));
    const reef = waterFor(bench, "REEF");
    const bo = bench.person("Bo Lind", ["aquarist"], [reef.areaId]);
    expect(bench.ask(bo, listIncidents, {})).toEqual([]);
    expect(refusal(() => bench.ask(bo, getIncident, { incidentId }))).toBe("not-found");
    expect(refusal(() => bench.run(bo, addIncidentNote, { incidentId, text: "hello there" }))).toBe(
      "not-allowed",
    );
    expect(
      refusal(() =>
        bench.run(bo, openIncident, { readingId: read("19.2", NOON + MINUTE_MS), title: "Warm" }),
      ),
    ).toBe("not-allowed");
  });

  it("an incident is given to somebody who works here", () => {
    const { bench, ines, joe, open, read, shown } = begin();
    const { incidentId } = open(read("19.1", NOON));
    bench.run(joe, setOwner, { incidentId, ownerId: ines.personId ?? 0 });
    expect(shown(incidentId).incident.ownerId).toBe(ines.personId);
    expect(() => bench.run(joe, setOwner, { incidentId, ownerId: 999 })).toThrow("no such person");
  });
});
