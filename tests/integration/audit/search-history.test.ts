import { beforeEach, describe, expect, it } from "vitest";
import { RECORD_GATES } from "@/app/_server/record-gates";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import {
  capturedTables,
  getEntry,
  getRecordAt,
  getRecordHistory,
  listEntries,
  listSubjectTypes,
  listVerbs,
  nameRecords,
  useRecordGates,
} from "@/modules/audit";
import { correctReading, recordReadings } from "@/modules/measurements";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

beforeEach(() => useRecordGates(RECORD_GATES));

/** Two areas; Joe works in the first alone, reads 24 days at noon and mends the first reading on the third day. */
function readFor24Days() {
  const bench = testBench(NOON);
  const [kelp, reef] = [waterFor(bench, "KELP"), waterFor(bench, "REEF")];
  const joe = bench.person("Joe Okafor", ["aquarist"], [kelp.areaId]);
  const ada = bench.person("Ada Finch", ["aquarist"], [reef.areaId]);
  const auditor = bench.person("Ruth Calder", ["auditor"]);
  const firstEntry = bench.ask(auditor, listEntries, {}).entries[0]?.id ?? 0;
  const ids: number[] = [];
  for (let day = 0; day < 24; day += 1) {
    bench.clock.set(NOON + day * DAY_MS);
    const { readings } = bench.run(joe, recordReadings, {
      readings: [kelp.reading(kelp.temperatureId, `1${day % 10}.2`, bench.clock.now())],
    });
    ids.push(readings[0]?.readingId ?? 0);
    if (day === 2) {
      bench.clock.set(NOON + day * DAY_MS + HOUR_MS);
      bench.run(joe, correctReading, {
        readingId: ids[0] ?? 0,
        uuid: crypto.randomUUID(),
        typedText: "10.4",
        reason: "misread",
      });
    }
  }
  bench.run(ada, recordReadings, { readings: [reef.reading(reef.temperatureId, "25.1", bench.clock.now())] });
  return { bench, kelp, reef, joe, ada, auditor, ids, firstEntry };
}

describe("the history", () => {
  it("is searched by person, action, subject and period, alone and together", () => {
    const { bench, joe, ada, auditor, ids } = readFor24Days();
    const found = (filter: Parameters<typeof listEntries.run>[1] | object) =>
      bench.ask(auditor, listEntries, { ...filter, limit: 200 }).entries;
    expect(found({ personId: joe.personId })).toHaveLength(25);
    expect(found({ personId: ada.personId }).map((entry) => entry.verb)).toEqual(["reading.recorded"]);
    expect(found({ verb: "reading.corrected" }).map((entry) => entry.reason)).toEqual(["misread"]);
    expect(found({ verb: "reading.corrected", personId: ada.personId })).toEqual([]);
    expect(found({ actorKind: "system" }).every((entry) => entry.actorId === null)).toBe(true);
    const about = found({ subjectType: "reading", subjectId: String(ids[0]) });
    expect(about.map((entry) => entry.verb)).toContain("reading.recorded");
    expect(about.every((entry) => entry.subjectId === String(ids[0]))).toBe(true);
    const day = { fromAt: NOON + 2 * DAY_MS, toAt: NOON + 3 * DAY_MS };
    expect(found(day).map((entry) => entry.verb)).toEqual(["reading.corrected", "reading.recorded"]);
    expect(found({ ...day, verb: "reading.recorded" })).toHaveLength(1);
    expect(found({ fromAt: day.toAt, toAt: day.toAt })).toEqual([]);
  });

  it("is paged both ways without a gap, an entry twice, or another order", () => {
    const { bench, auditor } = readFor24Days();
    const everything = bench.ask(auditor, listEntries, { limit: 200 }).entries.map((entry) => entry.id);
    expect(everything).toEqual(everything.toSorted((a, b) => b - a));
    const older: number[] = [];
    let before: number | undefined;
    for (let more = true; more; ) {
      const page = bench.ask(auditor, listEntries, { before, limit: 7 });
      older.push(...page.entries.map((entry) => entry.id));
      before = older.at(-1);
      more = page.hasMore;
    }
    expect(older).toEqual(everything);
    const newer: number[] = [];
    let after: number | undefined = everything.at(-1);
    for (let more = true; more; ) {
      const page = bench.ask(auditor, listEntries, { after, limit: 7 });
      newer.unshift(...page.entries.map((entry) => entry.id));
      after = newer[0];
      more = page.hasMore;
    }
    expect(newer).toEqual(everything.slice(0, -1));
  });

  it("keeps entries apart that were written in one millisecond", () => {
    const { bench, joe, kelp, auditor } = readFor24Days();
    for (const text of ["11.1", "11.2", "11.3"]) {
      bench.run(joe, recordReadings, {
        readings: [kelp.reading(kelp.temperatureId, text, bench.clock.now())],
      });
    }
    const [newest, second] = bench.ask(auditor, listEntries, { limit: 2 }).entries;
    expect(newest?.at).toBe(second?.at);
    const next = bench.ask(auditor, listEntries, { before: second?.id, limit: 1 }).entries[0];
    expect(next?.id).toBe((second?.id ?? 0) - 1);
  });

  it("knows which actions and subjects occur", () => {
    const { bench, auditor } = readFor24Days();
    const verbs = bench.ask(auditor, listVerbs, {});
    expect(verbs).toContain("reading.corrected");
    expect(verbs).toEqual([...new Set(verbs)].toSorted());
    expect(bench.ask(auditor, listSubjectTypes, {})).toContain("reading");
  });

  it("is refused whole to those who may read single records alone", () => {
    const { bench, joe } = readFor24Days();
    const reader = bench.person("Elin Voss", ["reader"]);
    for (const actor of [joe, reader]) {
      expect(() => bench.ask(actor, listEntries, {})).toThrow("does not allow you to read the whole history");
      expect(() => bench.ask(actor, getEntry, { entryId: 1 })).toThrow("does not allow you");
      expect(() => bench.ask(actor, listVerbs, {})).toThrow("does not allow you");
    }
  });

  it("shows an entry's changes by pages, forwards and backwards", () => {
    const { bench, joe, kelp, auditor } = readFor24Days();
    bench.run(joe, recordReadings, {
      readings: Array.from({ length: 12 }, (_, number) =>
        kelp.reading(kelp.temperatureId, `1${number % 10}.5`, bench.clock.now() - number * HOUR_MS),
      ),
    });
    const entryId = bench.ask(auditor, listEntries, { limit: 1 }).entries[0]?.id ?? 0;
    const first = bench.ask(auditor, getEntry, { entryId, limit: 5 });
    expect(first).toMatchObject({ hasEarlier: false, hasLater: true });
    const second = bench.ask(auditor, getEntry, { entryId, limit: 5, afterChange: first.changes.at(-1)?.id });
    expect(second.hasEarlier).toBe(true);
    const back = bench.ask(auditor, getEntry, { entryId, limit: 5, beforeChange: second.changes[0]?.id });
    expect(back.changes).toEqual(first.changes);
    expect(back).toMatchObject({ hasEarlier: false, hasLater: true });
    expect(first.entry.changeCount).toBeGreaterThanOrEqual(12);
    expect(() => bench.ask(auditor, getEntry, { entryId: 99_999 })).toThrow("There is no such entry");
  });
});

describe("a record's own history", () => {
  it("tells each change with who, when and why, newest first", () => {
    const { bench, joe, ids } = readFor24Days();
    const { changes } = bench.ask(joe, getRecordHistory, {
      table: "measurements_reading",
      key: String(ids[0]),
    });
    expect(changes.length).toBeGreaterThanOrEqual(2);
    expect(changes.map((change) => change.id)).toEqual(
      changes.map((change) => change.id).toSorted((a, b) => b - a),
    );
    expect(JSON.parse(changes[0]?.superseded?.row ?? "{}")).toMatchObject({ id: ids[0], typed_text: "10.2" });
    expect(changes[0]).toMatchObject({ verb: "reading.corrected", reason: "misread", actorId: joe.personId });
    expect(changes.at(-1)).toMatchObject({ verb: "reading.recorded", operation: "insert", before: null });
  });

  it("gives the record as it was at a chosen moment, and says when there was none yet", () => {
    const { bench, joe, ids } = readFor24Days();
    const record = { table: "measurements_reading", key: String(ids[0]) };
    const at = (moment: number) => bench.ask(joe, getRecordAt, { ...record, at: moment });
    const [made, mended] = [NOON, NOON + 2 * DAY_MS + HOUR_MS];
    expect(at(made - 1)).toMatchObject({ row: null, entry: null });
    const before = at(mended - 1).row;
    expect(at(made).row).toEqual(before);
    const after = at(mended).row;
    expect(before).toMatchObject({ typed_text: "10.2" });
    expect(after).toMatchObject({ typed_text: "10.4", supersedes_id: ids[0] });
    const live = bench.db.reader.sqlite
      .prepare("select * from measurements_reading where id = ?")
      .get(after?.id);
    expect(after).toEqual(live);
  });

  it("of another area is hidden from a person bound to their own, who learns nothing of it", () => {
    const { bench, joe, ada, ids, reef, kelp } = readFor24Days();
    const record = { table: "measurements_reading", key: String(ids[0]) };
    expect(bench.ask(joe, getRecordHistory, record).changes.length).toBeGreaterThan(0);
    expect(() => bench.ask(ada, getRecordHistory, record)).toThrow(
      "There is no such record, or you may not see it.",
    );
    expect(() => bench.ask(ada, getRecordAt, { ...record, at: NOON })).toThrow("you may not see it");
    expect(() => bench.ask(ada, getRecordHistory, { ...record, key: "99999" })).toThrow("you may not see it");
    const names = bench.ask(ada, nameRecords, {
      records: [
        { table: "systems_system", key: String(reef.systemId) },
        { table: "systems_system", key: String(kelp.systemId) },
      ],
    });
    expect(names).toEqual({ [`systems_system/${reef.systemId}`]: "REEF-01" });
  });

  it("that tells of people is open to those alone who read the whole history", () => {
    const { bench, joe, auditor } = readFor24Days();
    const reader = bench.person("Elin Voss", ["reader"]);
    const record = { table: "identity_person", key: String(joe.personId) };
    for (const actor of [joe, reader])
      expect(() => bench.ask(actor, getRecordHistory, record)).toThrow("may not see it");
    expect(bench.ask(auditor, getRecordHistory, record).changes).toHaveLength(1);
  });

  it("is closed, not open, for a table that nobody has put a gate to", () => {
    const { bench, joe, ids } = readFor24Days();
    useRecordGates({});
    expect(() =>
      bench.ask(joe, getRecordHistory, { table: "measurements_reading", key: String(ids[0]) }),
    ).toThrow("may not see it");
  });
});

describe("the gates", () => {
  it("name tables and columns that exist, and lead to an area or to none", () => {
    const { db } = testBench();
    const tables = capturedTables(db.reader.sqlite);
    for (const [table, { area }] of Object.entries(RECORD_GATES)) {
      expect(tables, table).toContain(table);
      if (area === undefined || area === "itself") continue;
      const columns = db.reader.sqlite.pragma(`table_info(${table})`) as { name: string }[];
      expect(
        columns.map((column) => column.name),
        table,
      ).toContain(area[0]);
      expect(Object.keys(RECORD_GATES), table).toContain(area[1]);
    }
  });
});
