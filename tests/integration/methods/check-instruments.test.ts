import { describe, expect, it } from "vitest";
import {
  addCatalogue,
  createInstrument,
  createMethod,
  editInstrument,
  editMethod,
  findParameterByCode,
  getInstrument,
  listInstruments,
  listMethods,
  recordInstrumentCheck,
  retireParameter,
} from "@/modules/methods";
import { NOON, testBench } from "../../support/database";

const DAY = 86_400_000;
const METER = {
  code: "COND-01",
  name: "Hand-held conductivity meter",
  serial: "S-1187",
  principle: "four-electrode cell",
  checkEveryDays: "7",
};
const STANDARD = { standard: "12.88 mS/cm at 25 °C, lot 41", standardValue: "12,88", unit: "mS/cm" };

function bench() {
  const it = testBench();
  const analyst = it.person("Noor Castell", ["analyst"]);
  const admin = it.person("Ines Marlow", ["admin"]);
  it.run(admin, addCatalogue, {});
  const parameterId = (code: string) => findParameterByCode(it.db.reader.orm, code)?.id ?? 0;
  const { id } = it.run(analyst, createInstrument, METER);
  const check = (fields: object) =>
    it.run(analyst, recordInstrumentCheck, { instrumentId: id, ...STANDARD, verdict: "good", ...fields });
  const meter = () => it.ask(analyst, getInstrument, { code: "cond-01" });
  return { ...it, analyst, admin, parameterId, id, check, meter };
}

const refusal = (act: () => unknown): { code: string; errors: { pointer: string; detail: string }[] } => {
  try {
    act();
  } catch (error) {
    return error as ReturnType<typeof refusal>;
  }
  throw new Error("it was not refused");
};

describe("a check of an instrument", () => {
  it("is kept with standard, as found, as left and the day on which the next is due", () => {
    const { check, meter, parameterId, analyst } = bench();
    expect(meter()).toMatchObject({ lastCheck: null, due: { state: "never-checked", isOverdue: true } });
    const { dueOn } = check({
      parameterId: parameterId("conductivity"),
      asFound: "12.61",
      asLeft: "12.88",
      verdict: "adjusted",
    });
    expect(dueOn).toBe("2026-03-09");
    expect(meter().checks[0]).toMatchObject({
      standard: "12.88 mS/cm at 25 °C, lot 41",
      standardValue: 12.88,
      asFound: 12.61,
      asLeft: 12.88,
      unit: "mS/cm",
      parameterName: "Conductivity",
      checkedBy: analyst.personId,
      checkedAt: NOON,
      verdict: "adjusted",
    });
    expect(meter().due).toEqual({ state: "due", dueOn: "2026-03-09", isOverdue: false });
  });

  it("is overdue on the day after its due day, in the list too", () => {
    const { check, clock, ask, analyst } = bench();
    check({});
    const listed = () => ask(analyst, listInstruments, {})[0]?.due.isOverdue;
    clock.set(NOON + 7 * DAY);
    expect(listed()).toBe(false);
    clock.set(NOON + 8 * DAY);
    expect(listed()).toBe(true);
  });

  it("that failed leaves the instrument overdue until a good one follows; the newest by its moment counts", () => {
    const { check, meter, clock } = bench();
    clock.set(NOON + DAY);
    check({ verdict: "failed", asFound: 14 });
    check({ checkedAt: NOON, note: "entered late" });
    expect(meter().due).toMatchObject({ state: "failed", isOverdue: true });
    expect(meter().checks.map((each) => each.verdict)).toEqual(["failed", "good"]);
    clock.set(NOON + DAY + 3_600_000);
    check({});
    expect(meter().due).toEqual({ state: "due", dueOn: "2026-03-10", isOverdue: false });
  });

  it("is refused in the future, without what an adjustment rests on, or in a unit that does not fit", () => {
    const { check, meter, parameterId } = bench();
    expect(refusal(() => check({ checkedAt: NOON + 1 })).errors[0]?.pointer).toBe("/checkedAt");
    expect(refusal(() => check({ verdict: "adjusted", asFound: 1 })).errors[0]?.pointer).toBe("/asLeft");
    expect(refusal(() => check({ verdict: "adjusted", asLeft: 1 })).errors[0]?.pointer).toBe("/asFound");
    const unit = refusal(() => check({ parameterId: parameterId("conductivity"), unit: "kg" }));
    expect(unit.errors[0]).toMatchObject({ pointer: "/unit" });
    expect(unit.errors[0]?.detail).toContain("mS/cm");
    expect(refusal(() => check({ standard: "" })).errors[0]?.pointer).toBe("/standard");
    expect(refusal(() => check({ asFound: "about 12" })).errors[0]?.pointer).toBe("/asFound");
    expect(meter().checks).toEqual([]);
  });

  it("may be made by an aquarist, not by an auditor", () => {
    const { person, run, id } = bench();
    const fields = { instrumentId: id, ...STANDARD, verdict: "good" as const };
    run(person("Joe Okafor", ["aquarist"], [1]), recordInstrumentCheck, fields);
    expect(refusal(() => run(person("Ada Finch", ["auditor"]), recordInstrumentCheck, fields)).code).toBe(
      "not-allowed",
    );
  });
});

describe("an instrument", () => {
  it("is retired with a reason, keeps its checks, and is neither checked nor changed after", () => {
    const { check, meter, run, ask, analyst, id } = bench();
    check({});
    const { code: _code, ...fields } = METER;
    const retired = { ...fields, instrumentId: id, state: "retired" as const };
    expect(refusal(() => run(analyst, editInstrument, retired)).errors[0]?.pointer).toBe("/retiredReason");
    run(analyst, editInstrument, { ...retired, retiredReason: "Cell cracked" });
    expect(meter()).toMatchObject({
      state: "retired",
      retiredReason: "Cell cracked",
      due: { isOverdue: false },
    });
    expect(meter().checks).toHaveLength(1);
    expect(ask(analyst, listInstruments, {})).toEqual([]);
    expect(refusal(() => check({})).code).toBe("conflict");
    expect(refusal(() => run(analyst, editInstrument, { ...retired, state: "in-use" })).code).toBe(
      "conflict",
    );
  });

  it("that there is not is not found", () => {
    const { ask, analyst } = bench();
    expect(refusal(() => ask(analyst, getInstrument, { code: "NONE-1" })).code).toBe("not-found");
  });

  it("is refused under a taken code or without a serial", () => {
    const { run, analyst } = bench();
    expect(
      refusal(() => run(analyst, createInstrument, { ...METER, code: "cond-01" })).errors[0]?.pointer,
    ).toBe("/code");
    expect(
      refusal(() => run(analyst, createInstrument, { ...METER, code: "COND-02", serial: " " })).errors[0]
        ?.pointer,
    ).toBe("/serial");
  });
});

describe("a method", () => {
  it("is set up for a parameter, changed, retired and taken back", () => {
    const { run, ask, analyst, parameterId } = bench();
    const nitrate = parameterId("nitrate_n") || parameterId("calcium");
    const { id } = run(analyst, createMethod, {
      code: "m-12",
      name: "Titration",
      parameterId: nitrate,
      principle: "EDTA titration",
    });
    const list = (includeRetired: boolean) =>
      ask(analyst, listMethods, { parameterId: nitrate, includeRetired });
    expect(list(false)).toMatchObject([{ code: "M-12", parameterId: nitrate, isRetired: false }]);
    run(analyst, editMethod, {
      methodId: id,
      name: "Titration",
      principle: "EDTA titration, 25 mL",
      isRetired: true,
    });
    expect(list(false)).toEqual([]);
    expect(list(true)).toMatchObject([{ principle: "EDTA titration, 25 mL", isRetired: true }]);
    run(analyst, editMethod, { methodId: id, name: "Titration", principle: "EDTA titration, 25 mL" });
    expect(list(false)).toHaveLength(1);
  });

  it("is refused for a retired parameter and under a taken code", () => {
    const { run, admin, analyst, parameterId } = bench();
    const fields = { code: "M-1", name: "Titration", principle: "EDTA titration" };
    run(admin, retireParameter, { parameterId: parameterId("calcium"), reason: "Not measured here" });
    expect(
      refusal(() => run(analyst, createMethod, { ...fields, parameterId: parameterId("calcium") })).errors[0]
        ?.pointer,
    ).toBe("/parameterId");
    run(analyst, createMethod, { ...fields, parameterId: parameterId("magnesium") });
    expect(
      refusal(() =>
        run(analyst, createMethod, { ...fields, code: "m-1", parameterId: parameterId("magnesium") }),
      ).errors[0]?.pointer,
    ).toBe("/code");
  });
});
