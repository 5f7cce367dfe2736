import { describe, expect, it } from "vitest";
import {
  addEquipment,
  addPoint,
  editEquipment,
  editPoint,
  getPoint,
  listEquipment,
  listPoints,
  pointsById,
  retireSystem,
} from "@/modules/systems";
import { type Facility, facility } from "./facility";

const bottom = { code: "BOTTOM", name: "Bottom drain", kind: "bottom" } as const;
const points = (bench: Facility, includeRetired = false) =>
  bench.ask(bench.lead, listPoints, { systemId: bench.kelpId, includeRetired });

describe("points", () => {
  it("come beside the default one, whose place a new default takes", () => {
    const bench = facility();
    bench.run(bench.lead, addPoint, { ...bottom, systemId: bench.kelpId });
    expect(points(bench).map((each) => [each.code, each.isDefault])).toEqual([
      ["SURFACE", true],
      ["BOTTOM", false],
    ]);
    bench.run(bench.lead, addPoint, {
      code: "SUMP",
      name: "Sump",
      kind: "sump",
      systemId: bench.kelpId,
      isDefault: true,
    });
    expect(points(bench).map((each) => [each.code, each.isDefault])).toEqual([
      ["SUMP", true],
      ["BOTTOM", false],
      ["SURFACE", false],
    ]);
  });

  it("may share a code between systems but not within one", () => {
    const bench = facility();
    bench.run(bench.lead, addPoint, { ...bottom, systemId: bench.kelpId });
    bench.run(bench.lead, addPoint, { ...bottom, systemId: bench.isolationId });
    expect(() =>
      bench.run(bench.lead, addPoint, { ...bottom, code: "bottom", systemId: bench.kelpId }),
    ).toThrow(/BOTTOM is taken/);
  });

  it("leave a system never without a default point in use", () => {
    const bench = facility();
    const [surface] = points(bench);
    const edit = { code: "SURFACE", name: "Surface", kind: "surface", pointId: surface?.id ?? 0 } as const;
    expect(() => bench.run(bench.lead, editPoint, { ...edit, isDefault: false, isInUse: true })).toThrow(
      /another one the default/,
    );
    expect(() => bench.run(bench.lead, editPoint, { ...edit, isDefault: true, isInUse: false })).toThrow(
      /stays in use/,
    );
    const { id } = bench.run(bench.lead, addPoint, { ...bottom, systemId: bench.kelpId });
    bench.run(bench.lead, editPoint, { ...bottom, pointId: id, isDefault: true, isInUse: true });
    bench.run(bench.lead, editPoint, { ...edit, isDefault: false, isInUse: false });
    expect(points(bench).map((each) => each.code)).toEqual(["BOTTOM"]);
    expect(points(bench, true).map((each) => each.code)).toEqual(["BOTTOM", "SURFACE"]);
  });

  it("tell a command which system and area they belong to", () => {
    const bench = facility();
    const [surface] = points(bench);
    const db = bench.db.reader.orm;
    expect(getPoint(db, surface?.id ?? 0)).toMatchObject({ systemCode: "KELP-01", areaId: bench.galleryId });
    expect(pointsById(db, [surface?.id ?? 0, 999])).toHaveLength(1);
    expect(pointsById(db, [])).toEqual([]);
    expect(() => getPoint(db, 999)).toThrow(/no such point/);
  });

  it("are shown for own areas alone, and set up by administrators and leads", () => {
    const bench = facility();
    expect(bench.ask(bench.aquarist, listPoints, {}).map((each) => each.systemCode)).toEqual(["KELP-01"]);
    expect(bench.ask(bench.aquarist, listPoints, { systemId: bench.isolationId })).toEqual([]);
    for (const actor of [bench.operator, bench.aquarist, bench.reader]) {
      expect(() => bench.run(actor, addPoint, { ...bottom, systemId: bench.kelpId })).toThrow(
        /does not allow/,
      );
    }
  });

  it("are not added to a retired system", () => {
    const bench = facility();
    bench.run(bench.lead, retireSystem, { systemId: bench.kelpId, reason: "taken down" });
    expect(() => bench.run(bench.lead, addPoint, { ...bottom, systemId: bench.kelpId })).toThrow(/retired/);
    expect(points(bench)).toEqual([]);
    expect(points(bench, true)).toHaveLength(1);
  });
});

describe("equipment", () => {
  const pump = { code: "P-1", name: "Main pump", kind: "pump" } as const;

  it("is set up and changed by an operator", () => {
    const bench = facility();
    const { id } = bench.run(bench.operator, addEquipment, { ...pump, systemId: bench.kelpId });
    bench.run(bench.operator, editEquipment, {
      ...pump,
      equipmentId: id,
      state: "out-of-service",
      notes: "bearing",
    });
    expect(bench.ask(bench.reader, listEquipment, { systemId: bench.kelpId })).toMatchObject([
      { ...pump, systemCode: "KELP-01", state: "out-of-service", notes: "bearing" },
    ]);
    expect(bench.ask(bench.aquarist, listEquipment, { systemId: bench.isolationId })).toEqual([]);
  });

  it("is refused with a taken code, an unknown kind, a retired system, and from an aquarist", () => {
    const bench = facility();
    bench.run(bench.operator, addEquipment, { ...pump, systemId: bench.kelpId });
    expect(() => bench.run(bench.operator, addEquipment, { ...pump, systemId: bench.kelpId })).toThrow(
      /taken/,
    );
    const odd = { ...pump, kind: "turbine" as "pump", code: "T-1", systemId: bench.kelpId };
    expect(() => bench.run(bench.operator, addEquipment, odd)).toThrow(/must be mended/);
    expect(() =>
      bench.run(bench.aquarist, addEquipment, { ...pump, code: "P-2", systemId: bench.kelpId }),
    ).toThrow(/does not allow/);
    bench.run(bench.lead, retireSystem, { systemId: bench.kelpId, reason: "taken down" });
    expect(() =>
      bench.run(bench.operator, addEquipment, { ...pump, code: "P-2", systemId: bench.kelpId }),
    ).toThrow(/retired/);
    expect(() => bench.run(bench.operator, editEquipment, { ...pump, equipmentId: 99 })).toThrow(
      /no such equipment/,
    );
  });
});
