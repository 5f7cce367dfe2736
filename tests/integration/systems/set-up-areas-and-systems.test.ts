import { describe, expect, it } from "vitest";
import {
  createArea,
  createSite,
  createSystem,
  editArea,
  editSystem,
  getSystem,
  listAreas,
  listSites,
  listSystems,
  retireSystem,
  setOperatingLevel,
  volumeOf,
} from "@/modules/systems";
import { testBench } from "../../support/database";
import { entryCount, facility, kelp } from "./facility";

const area = { code: "REEF", name: "Reef gallery", biosecurityLevel: 1, walkingOrder: 5 };

describe("setting up areas", () => {
  it("asks for the site first, then puts the area on the only site there is", () => {
    const bench = testBench();
    const admin = bench.person("Ada Admin", ["admin"]);
    expect(() => bench.run(admin, createArea, area)).toThrow(/Set up the site first/);
    const { id } = bench.run(admin, createSite, { code: "main", name: "Main site" });
    bench.run(admin, createArea, area);
    expect(bench.ask(admin, listSites, {})).toEqual([{ id, code: "MAIN", name: "Main site" }]);
    expect(bench.ask(admin, listAreas, {})).toMatchObject([{ ...area, siteId: id, systemCount: 0 }]);
  });

  it("asks which site is meant where there are two", () => {
    const bench = facility();
    bench.run(bench.admin, createSite, { code: "NORTH", name: "North site" });
    expect(() => bench.run(bench.admin, createArea, area)).toThrow(/Choose the site/);
  });

  it("changes an area and keeps its code its own, whatever the case", () => {
    const bench = facility();
    const { id } = bench.run(bench.admin, createArea, area);
    bench.run(bench.admin, editArea, { ...area, areaId: id, name: "Reef hall", biosecurityLevel: "2" });
    expect(bench.ask(bench.admin, listAreas, {}).find((each) => each.id === id)).toMatchObject({
      name: "Reef hall",
      biosecurityLevel: 2,
    });
    expect(() => bench.run(bench.admin, createArea, { ...area, code: "gal" })).toThrow(/GAL is taken/);
    expect(() => bench.run(bench.admin, editArea, { ...area, areaId: id, code: "GAL" })).toThrow(/taken/);
  });

  it("refuses a biosecurity level beyond 4, an empty walking order and an impossible code, all at once", () => {
    const bench = facility();
    let errors: { pointer: string }[] = [];
    try {
      bench.run(bench.admin, createArea, { code: "a b", name: " ", biosecurityLevel: 5, walkingOrder: "" });
    } catch (error) {
      errors = (error as { errors: { pointer: string }[] }).errors;
    }
    expect(errors.map((each) => each.pointer).sort()).toEqual([
      "/biosecurityLevel",
      "/code",
      "/name",
      "/walkingOrder",
    ]);
  });

  it("is for an administrator alone, and a refusal leaves no entry in the history", () => {
    const bench = facility();
    const before = entryCount(bench);
    for (const actor of [bench.lead, bench.operator, bench.aquarist, bench.reader]) {
      expect(() => bench.run(actor, createArea, area)).toThrow(/Your role does not allow/);
    }
    expect(entryCount(bench)).toBe(before);
  });
});

describe("setting up systems", () => {
  it("gives a new system its default point", () => {
    const bench = facility();
    const found = bench.ask(bench.lead, getSystem, { code: "kelp-01" });
    expect(found).toMatchObject({ ...kelp, areaCode: "GAL", state: "in-service", volumeL: null });
    expect(found.points).toMatchObject([{ code: "SURFACE", isDefault: true, isInUse: true }]);
  });

  it("lists systems in walking order of areas and systems", () => {
    const bench = facility();
    const add = (code: string, walkingOrder: number) =>
      bench.run(bench.lead, createSystem, { ...kelp, code, walkingOrder, areaId: bench.galleryId });
    add("REEF-02", 30);
    add("REEF-01", 5);
    const codes = bench.ask(bench.reader, listSystems, {}).map((each) => each.code);
    expect(codes).toEqual(["REEF-01", "KELP-01", "REEF-02", "QUAR-01"]);
    expect(bench.ask(bench.reader, listSystems, { kind: "quarantine" }).map((each) => each.code)).toEqual([
      "QUAR-01",
    ]);
  });

  it("shows an aquarist the systems of their own areas alone", () => {
    const bench = facility();
    expect(bench.ask(bench.aquarist, listSystems, {}).map((each) => each.code)).toEqual(["KELP-01"]);
    expect(bench.ask(bench.aquarist, listAreas, {}).map((each) => each.code)).toEqual(["GAL"]);
    expect(() => bench.ask(bench.aquarist, getSystem, { code: "QUAR-01" })).toThrow(/no system QUAR-01/);
  });

  it("changes a system, and refuses a code that is taken and an area that does not exist", () => {
    const bench = facility();
    const edit = {
      ...kelp,
      systemId: bench.kelpId,
      areaId: bench.quarantineId,
      state: "out-of-service",
    } as const;
    bench.run(bench.lead, editSystem, { ...edit, name: "Giant kelp" });
    expect(bench.ask(bench.lead, getSystem, { code: "KELP-01" })).toMatchObject({
      name: "Giant kelp",
      areaCode: "QUA",
      state: "out-of-service",
    });
    expect(() => bench.run(bench.lead, editSystem, { ...edit, code: "QUAR-01" })).toThrow(/taken/);
    expect(() => bench.run(bench.lead, editSystem, { ...edit, areaId: 999 })).toThrow(/no such area/);
    expect(() => bench.run(bench.lead, editSystem, { ...edit, systemId: 999 })).toThrow(/no such system/);
  });

  it("is not for operators, aquarists and readers", () => {
    const bench = facility();
    for (const actor of [bench.operator, bench.aquarist, bench.reader]) {
      expect(() => bench.run(actor, createSystem, { ...kelp, code: "X-1", areaId: bench.galleryId })).toThrow(
        /does not allow/,
      );
    }
  });
});

describe("retiring a system", () => {
  it("keeps it to be seen, parts it from joined water, and lets nobody change it", () => {
    const bench = facility();
    bench.run(bench.operator, setOperatingLevel, {
      systemId: bench.kelpId,
      levelOffset: { text: "0" },
      joinedWith: [bench.isolationId],
      reason: "shared filter",
    });
    bench.clock.set(bench.clock.now() + 1000);
    bench.run(bench.lead, retireSystem, { systemId: bench.kelpId, reason: "taken down" });
    expect(bench.ask(bench.lead, listSystems, {}).map((each) => each.code)).toEqual(["QUAR-01"]);
    expect(bench.ask(bench.lead, listSystems, { includeRetired: "true" })).toHaveLength(2);
    expect(bench.ask(bench.lead, getSystem, { code: "KELP-01" })).toMatchObject({
      state: "retired",
      retiredReason: "taken down",
    });
    expect(bench.ask(bench.lead, volumeOf, { code: "QUAR-01" }).joinedWith).toEqual([]);
    const edit = { ...kelp, systemId: bench.kelpId, areaId: bench.galleryId, state: "in-service" } as const;
    expect(() => bench.run(bench.lead, editSystem, edit)).toThrow(/is retired/);
    expect(() => bench.run(bench.lead, retireSystem, { systemId: bench.kelpId, reason: "again" })).toThrow(
      /retired already/,
    );
  });

  it("asks for a reason", () => {
    const bench = facility();
    expect(() => bench.run(bench.lead, retireSystem, { systemId: bench.kelpId, reason: " " })).toThrow(
      /must be mended/,
    );
  });
});
