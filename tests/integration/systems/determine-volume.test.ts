import { describe, expect, it } from "vitest";
import {
  approveVolume,
  declineVolume,
  listSystems,
  listWaitingVolumes,
  proposeVolume,
  retireSystem,
  setOperatingLevel,
  volumeOf,
} from "@/modules/systems";
import { boxOf1000L, entryCount, type Facility, facility } from "./facility";

const HOUR = 3_600_000;
const sheet = (bench: Facility, code = "KELP-01") => bench.ask(bench.lead, volumeOf, { code });

function approved1000L(bench: Facility, lengthUncertainty?: string): number {
  const { id } = bench.run(bench.operator, proposeVolume, {
    method: "geometry",
    systemId: bench.kelpId,
    components: [boxOf1000L(lengthUncertainty)],
  });
  bench.run(bench.lead, approveVolume, { determinationId: id });
  return id;
}

/** A tracer test in litres. */
function propose(
  bench: Facility,
  litres: string,
  uncertainty: string,
  effectiveFromAt: number | null = null,
) {
  return bench.run(bench.operator, proposeVolume, {
    method: "tracer",
    systemId: bench.kelpId,
    volume: { text: litres, uncertainty },
    note: "12.0 g of tracer, rise 0.012 g/L",
    effectiveFromAt,
  });
}

function codeOf(act: () => unknown): string {
  try {
    act();
  } catch (error) {
    return (error as { code?: string }).code ?? String(error);
  }
  return "nothing was thrown";
}

describe("the volume of record", () => {
  // Expected figures by hand: 2 × 1 × 0.5 m = 1,000 L; u = 1000 · 1 · 0.5 · 0.01 = 5 L (JCGM 100:2008, 5.1.2); surface 2 m².
  it("is the proposed geometry once another person has approved it", () => {
    const bench = facility();
    expect(sheet(bench)).toMatchObject({ record: null, operating: null });
    expect(sheet(bench).operatingSays).toMatch(/No volume has been approved/);
    const id = approved1000L(bench);
    const { record, operating, system } = sheet(bench);
    expect(record).toMatchObject({ id, method: "geometry", status: "approved", isOfRecord: true });
    expect(record).toMatchObject({ proposedBy: "Olga Operator", decidedBy: "Lena Lead", surfaceAreaM2: 2 });
    expect(record?.volumeL).toBeCloseTo(1000, 9);
    expect(record?.standardUncertaintyL).toBeCloseTo(5, 9);
    expect(record?.geometry?.typed[0]).toMatchObject({ name: "basin", fillDepth: { text: "0,5" } });
    expect(operating?.value).toBeCloseTo(1000, 9);
    expect(system.volumeL).toBeCloseTo(1000, 9);
    expect(bench.ask(bench.reader, listSystems, {})[0]?.volumeL).toBeCloseTo(1000, 9);
  });

  it("is never approved or declined by the person who proposed it", () => {
    const bench = facility();
    const { id } = bench.run(bench.lead, proposeVolume, {
      method: "geometry",
      systemId: bench.kelpId,
      components: [boxOf1000L()],
    });
    const before = entryCount(bench);
    expect(codeOf(() => bench.run(bench.lead, approveVolume, { determinationId: id }))).toBe("own-work");
    expect(codeOf(() => bench.run(bench.lead, declineVolume, { determinationId: id, reason: "wrong" }))).toBe(
      "own-work",
    );
    expect(entryCount(bench)).toBe(before);
    bench.run(bench.otherLead, approveVolume, { determinationId: id });
    expect(sheet(bench).record?.id).toBe(id);
  });

  it("is approved by a lead alone, and decided on once", () => {
    const bench = facility();
    const { id } = propose(bench, "1000", "10");
    for (const actor of [bench.admin, bench.aquarist, bench.reader]) {
      expect(codeOf(() => bench.run(actor, approveVolume, { determinationId: id }))).toBe("not-allowed");
    }
    bench.run(bench.lead, declineVolume, { determinationId: id, reason: "tracer not mixed" });
    expect(codeOf(() => bench.run(bench.lead, approveVolume, { determinationId: id }))).toBe("conflict");
    expect(sheet(bench).determinations).toMatchObject([
      { status: "declined", decisionReason: "tracer not mixed", isOfRecord: false },
    ]);
    expect(sheet(bench).record).toBeNull();
    expect(codeOf(() => bench.run(bench.lead, approveVolume, { determinationId: 99 }))).toBe("not-found");
  });

  it("counts from the moment it takes effect, past and future", () => {
    const bench = facility();
    const now = bench.clock.now();
    const first = propose(bench, "1000", "50", now - HOUR);
    const second = propose(bench, "1010", "50", now + HOUR);
    for (const { id } of [first, second]) bench.run(bench.lead, approveVolume, { determinationId: id });
    const recordAt = (at: number) =>
      bench.ask(bench.lead, volumeOf, { code: "KELP-01", at }).record?.id ?? null;
    expect(recordAt(now - HOUR - 1)).toBeNull();
    expect(recordAt(now - HOUR)).toBe(first.id);
    expect(recordAt(now)).toBe(first.id);
    expect(recordAt(now + HOUR)).toBe(second.id);
  });

  // By hand: |1,100 − 1,000| / √(5² + 12²) = 7.7 > 2; |1,020 − 1,000| / 13 = 1.5.
  it("is contradicted only after the approver has been shown by how much", () => {
    const bench = facility();
    approved1000L(bench);
    const close = propose(bench, "1020", "12");
    const far = propose(bench, "1100", "12");
    const shown = (id: number) => sheet(bench).determinations.find((each) => each.id === id)?.disagreement;
    expect(shown(close.id)).toBeNull();
    expect(shown(far.id)).toMatch(/differ by 100 L, which is 7\.7 times/);
    expect(codeOf(() => bench.run(bench.lead, approveVolume, { determinationId: far.id }))).toBe(
      "needs-confirmation",
    );
    expect(sheet(bench).record?.volumeL).toBeCloseTo(1000, 9);
    bench.clock.set(bench.clock.now() + HOUR);
    bench.run(bench.lead, approveVolume, {
      determinationId: far.id,
      acceptsDisagreement: true,
      reason: "rock removed",
    });
    expect(sheet(bench).record).toMatchObject({
      id: far.id,
      disagreement: expect.stringContaining("7.7 times"),
    });
  });

  it("waits in a list for whoever may see its area", () => {
    const bench = facility();
    const { id } = propose(bench, "1000", "10");
    expect(bench.ask(bench.lead, listWaitingVolumes, {})).toMatchObject([
      { id, systemCode: "KELP-01", volumeL: 1000 },
    ]);
    const elsewhere = bench.person("Eli Elsewhere", ["aquarist"], [bench.quarantineId]);
    expect(bench.ask(elsewhere, listWaitingVolumes, {})).toEqual([]);
    bench.run(bench.lead, approveVolume, { determinationId: id });
    expect(bench.ask(bench.lead, listWaitingVolumes, {})).toEqual([]);
  });
});

describe("proposing a volume", () => {
  it("is refused with every wrong field named where it stands", () => {
    const bench = facility();
    const wrong = [
      { ...boxOf1000L(), fillDepth: { text: "1.5" } },
      {
        ...boxOf1000L(),
        dimensions: { lengthM: { text: "two" }, widthM: { text: "1" }, heightM: { text: "1" } },
      },
      { ...boxOf1000L(), dimensions: { ...boxOf1000L().dimensions, girthM: { text: "1" } } },
    ];
    let errors: { pointer: string }[] = [];
    try {
      bench.run(bench.operator, proposeVolume, {
        method: "geometry",
        systemId: bench.kelpId,
        components: wrong,
      });
    } catch (error) {
      errors = (error as { errors: { pointer: string }[] }).errors;
    }
    expect(errors.map((each) => each.pointer)).toEqual([
      "/components/0/fillDepth",
      "/components/1/dimensions/lengthM",
      "/components/2/dimensions/girthM",
    ]);
  });

  it("is refused without components, for a retired system, and by an aquarist of another area", () => {
    const bench = facility();
    const of = (systemId: number) => ({ method: "geometry" as const, systemId, components: [boxOf1000L()] });
    const none = { method: "geometry" as const, systemId: bench.kelpId, components: [] };
    expect(codeOf(() => bench.run(bench.operator, proposeVolume, none))).toBe("invalid");
    expect(codeOf(() => bench.run(bench.aquarist, proposeVolume, of(bench.isolationId)))).toBe("not-allowed");
    expect(codeOf(() => bench.run(bench.reader, proposeVolume, of(bench.kelpId)))).toBe("not-allowed");
    expect(bench.run(bench.aquarist, proposeVolume, of(bench.kelpId)).volumeL).toBeCloseTo(1000, 9);
    bench.run(bench.lead, retireSystem, { systemId: bench.kelpId, reason: "taken down" });
    expect(codeOf(() => bench.run(bench.operator, proposeVolume, of(bench.kelpId)))).toBe("conflict");
  });

  it("sent twice under the same key is one proposal", () => {
    const bench = facility();
    const input = { method: "geometry" as const, systemId: bench.kelpId, components: [boxOf1000L()] };
    const [one, two] = [1, 2].map(() =>
      bench.run(bench.operator, proposeVolume, input, { idempotencyKey: "once" }),
    );
    expect(two).toEqual(one);
    expect(sheet(bench).determinations).toHaveLength(1);
  });
});

describe("the operating volume", () => {
  const level = (bench: Facility, text: string, more: object = {}) =>
    bench.run(bench.aquarist, setOperatingLevel, {
      systemId: bench.kelpId,
      levelOffset: { text, uncertainty: "0.5" },
      reason: "after the storm",
      ...more,
    });

  // By hand: 2 m² × −10 cm = −200 L; u = √(5² + (2000 · 0.005)²) = √125 L (JCGM 100:2008, 5.1.2).
  it("follows the level by the area of the surface", () => {
    const bench = facility();
    approved1000L(bench);
    level(bench, "−10");
    const { operating, level: stands } = sheet(bench);
    expect(operating?.value).toBeCloseTo(800, 9);
    expect(operating?.standardUncertainty).toBeCloseTo(Math.sqrt(125), 9);
    expect(stands).toMatchObject({ levelOffsetM: -0.1, setBy: "Aki Aquarist", reason: "after the storm" });
  });

  it("is nothing while drained, and the volume of record again at level 0", () => {
    const bench = facility();
    approved1000L(bench);
    level(bench, "0", { isDrained: true });
    expect(sheet(bench).operating).toEqual({ value: 0, standardUncertainty: 0 });
    level(bench, "0");
    expect(sheet(bench).operating?.value).toBeCloseTo(1000, 9);
  });

  it("refuses a level below the floor and leaves things as they were", () => {
    const bench = facility();
    approved1000L(bench);
    const before = entryCount(bench);
    expect(codeOf(() => level(bench, "-51"))).toBe("invalid");
    expect(entryCount(bench)).toBe(before);
    expect(sheet(bench).level).toBeNull();
  });

  it("says what is missing where the surface is not known", () => {
    const bench = facility();
    const { id } = propose(bench, "1000", "5");
    bench.run(bench.lead, approveVolume, { determinationId: id });
    level(bench, "-10");
    expect(sheet(bench).operating).toBeNull();
    expect(sheet(bench).operatingSays).toMatch(/area of the water's surface/);
  });

  it("of joined systems is shared, seen from either side, until they are parted", () => {
    const bench = facility();
    approved1000L(bench);
    const joined = bench.run(bench.operator, proposeVolume, {
      method: "tracer",
      systemId: bench.isolationId,
      volume: { text: "500", uncertainty: "12" },
      note: "salt tracer",
    });
    bench.run(bench.lead, approveVolume, { determinationId: joined.id });
    const set = (joinedWith: number[]) =>
      bench.run(bench.operator, setOperatingLevel, {
        systemId: bench.kelpId,
        levelOffset: { text: "0" },
        joinedWith,
        reason: "shared filter",
      });
    set([bench.isolationId]);
    expect(sheet(bench).joinedTotal?.value).toBeCloseTo(1500, 9);
    expect(sheet(bench).joinedTotal?.standardUncertainty).toBeCloseTo(13, 9);
    expect(sheet(bench, "QUAR-01").joinedWith.map((each) => each.code)).toEqual(["KELP-01"]);
    const seen = bench.ask(bench.aquarist, volumeOf, { code: "KELP-01" });
    expect(seen).toMatchObject({ joinedWith: [], joinedElsewhere: 1 });
    bench.clock.set(bench.clock.now() + 1);
    set([]);
    expect(sheet(bench)).toMatchObject({ joinedWith: [], joinedTotal: null });
  });

  it("is not joined with itself, nor with another area by an aquarist who is bound to one", () => {
    const bench = facility();
    expect(codeOf(() => level(bench, "0", { joinedWith: [bench.kelpId] }))).toBe("invalid");
    expect(codeOf(() => level(bench, "0", { joinedWith: [bench.isolationId] }))).toBe("not-allowed");
    expect(
      codeOf(() =>
        bench.run(bench.reader, setOperatingLevel, {
          systemId: bench.kelpId,
          levelOffset: { text: "0" },
          reason: "low water",
        }),
      ),
    ).toBe("not-allowed");
  });
});
