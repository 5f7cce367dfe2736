import { describe, expect, it } from "vitest";
import { listWatch, listWatchPlan, planWatch } from "@/modules/measurements";
import { createInstrument, createMethod, editInstrument, retireParameter } from "@/modules/methods";
import { testBench } from "../../support/database";
import { waterFor } from "../../support/water";

const INSTRUMENT = { name: "Thermometer", serial: "T-1", principle: "resistance" };

function begin() {
  const bench = testBench();
  const water = waterFor(bench);
  const ines = bench.person("Ines Marlow", ["lead"]);
  const plan = (items: object[], by = ines) =>
    bench.run(by, planWatch, { pointId: water.pointId, items: items as never });
  const order = () => bench.ask(ines, listWatchPlan, {}).map((each) => each.parameterId);
  return { bench, water, ines, plan, order };
}

const refusal = (act: () => unknown): { code: string; errors: { pointer: string; detail: string }[] } => {
  try {
    act();
  } catch (error) {
    return error as ReturnType<typeof refusal>;
  }
  throw new Error("it was not refused");
};

describe("what is read at a point", () => {
  it("stands in the order of the list, with how often, unit, method and instrument", () => {
    const { bench, water, ines, plan, order } = begin();
    const { temperatureId, ammoniaId } = water;
    const method = bench.run(ines, createMethod, {
      code: "M-1",
      name: "Probe",
      parameterId: temperatureId,
      principle: "probe",
    });
    const instrument = bench.run(ines, createInstrument, { code: "T-01", ...INSTRUMENT });
    plan([
      { parameterId: ammoniaId, everyDays: 7 },
      {
        parameterId: temperatureId,
        everyDays: 1,
        unit: "°F",
        methodId: method.id,
        instrumentId: instrument.id,
      },
    ]);
    expect(order()).toEqual([ammoniaId, temperatureId]);
    expect(bench.ask(ines, listWatch, {})[1]).toMatchObject({
      everyDays: 1,
      unit: "°F",
      methodId: method.id,
      instrumentId: instrument.id,
    });
    plan([{ parameterId: temperatureId, everyDays: null }, { parameterId: ammoniaId }]);
    expect(order()).toEqual([temperatureId, ammoniaId]);
  });

  it("is no longer asked for once it is off the list, and can come back", () => {
    const { water, plan, order } = begin();
    plan([{ parameterId: water.temperatureId }, { parameterId: water.ammoniaId }]);
    plan([{ parameterId: water.ammoniaId }]);
    expect(order()).toEqual([water.ammoniaId]);
    plan([{ parameterId: water.ammoniaId }, { parameterId: water.temperatureId }]);
    expect(order()).toEqual([water.ammoniaId, water.temperatureId]);
  });

  it("is refused twice, in a unit that does not fit, by another parameter's method, with a retired instrument", () => {
    const { bench, water, ines, plan, order } = begin();
    const { temperatureId, ammoniaId } = water;
    const method = bench.run(ines, createMethod, {
      code: "M-1",
      name: "Probe",
      parameterId: temperatureId,
      principle: "probe",
    });
    const { id } = bench.run(ines, createInstrument, { code: "T-01", ...INSTRUMENT });
    bench.run(ines, editInstrument, {
      ...INSTRUMENT,
      instrumentId: id,
      state: "retired",
      retiredReason: "Broken",
    });
    const pointer = (...items: object[]) => refusal(() => plan(items)).errors[0]?.pointer;
    expect(pointer({ parameterId: ammoniaId }, { parameterId: ammoniaId })).toBe("/items/1/parameterId");
    expect(pointer({ parameterId: ammoniaId, unit: "°F" })).toBe("/items/0/unit");
    expect(pointer({ parameterId: ammoniaId, methodId: method.id })).toBe("/items/0/methodId");
    expect(pointer({ parameterId: temperatureId, instrumentId: id })).toBe("/items/0/instrumentId");
    expect(pointer({ parameterId: temperatureId, everyDays: 0 })).toBe("/items/0/everyDays");
    expect(order()).toEqual([]);
  });

  it("takes no retired parameter that was not there before", () => {
    const { bench, water, plan, order } = begin();
    plan([{ parameterId: water.temperatureId }]);
    const admin = bench.person("Marek Dvorsky", ["admin"]);
    for (const parameterId of [water.temperatureId, water.ammoniaId]) {
      bench.run(admin, retireParameter, { parameterId, reason: "Not read here" });
    }
    expect(
      refusal(() => plan([{ parameterId: water.temperatureId }, { parameterId: water.ammoniaId }])).errors[0]
        ?.pointer,
    ).toBe("/items/1/parameterId");
    plan([{ parameterId: water.temperatureId, everyDays: 2 }]);
    expect(order()).toEqual([water.temperatureId]);
  });

  it("is said by neither aquarist nor analyst", () => {
    const { bench, water, plan } = begin();
    for (const role of ["aquarist", "operator", "analyst", "veterinarian", "auditor", "reader"] as const) {
      const someone = bench.person(`Somebody ${role}`, [role]);
      expect(refusal(() => plan([{ parameterId: water.temperatureId }], someone)).code).toBe("not-allowed");
    }
  });
});
