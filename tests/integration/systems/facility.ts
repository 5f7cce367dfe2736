import type { Actor } from "@/modules/access";
import { createArea, createSite, createSystem } from "@/modules/systems";
import { type TestBench, testBench } from "../../support/database";

/** A facility with a gallery and a quarantine building, a system in each, and the people whom the tests need. */
export type Facility = TestBench & {
  admin: Actor;
  lead: Actor;
  otherLead: Actor;
  operator: Actor;
  /** Bound to the gallery alone. */
  aquarist: Actor;
  reader: Actor;
  galleryId: number;
  quarantineId: number;
  kelpId: number;
  isolationId: number;
};

export const kelp = {
  code: "KELP-01",
  name: "Kelp forest",
  kind: "exhibit",
  waterType: "seawater",
  walkingOrder: 10,
} as const;

export function facility(): Facility {
  const bench = testBench();
  const admin = bench.person("Ada Admin", ["admin"]);
  bench.run(admin, createSite, { code: "MAIN", name: "Main site" });
  const area = (code: string, walkingOrder: number, biosecurityLevel: number) =>
    bench.run(admin, createArea, { code, name: `Area ${code}`, biosecurityLevel, walkingOrder }).id;
  const [galleryId, quarantineId] = [area("GAL", 1, 0), area("QUA", 2, 3)];
  const isolation = { ...kelp, code: "QUAR-01", name: "Isolation", kind: "quarantine" } as const;
  return {
    ...bench,
    admin,
    lead: bench.person("Lena Lead", ["lead"]),
    otherLead: bench.person("Otto Lead", ["lead"]),
    operator: bench.person("Olga Operator", ["operator"]),
    aquarist: bench.person("Aki Aquarist", ["aquarist"], [galleryId]),
    reader: bench.person("Rita Reader", ["reader"]),
    galleryId,
    quarantineId,
    kelpId: bench.run(admin, createSystem, { ...kelp, areaId: galleryId }).id,
    isolationId: bench.run(admin, createSystem, { ...isolation, areaId: quarantineId }).id,
  };
}

/** How many entries the history has: a refusal leaves it as it was. */
export function entryCount({ db }: TestBench): number {
  const row = db.reader.sqlite.prepare("select count(*) as n from audit_entry").get() as { n: number };
  return row.n;
}

/** A box of 2 × 1 × 1 m filled to 0.5 m (1,000 L, 2 m² of surface), with the standard uncertainty of the length in metres. */
export const boxOf1000L = (lengthUncertainty = "0.01") => ({
  name: "basin",
  shape: "box" as const,
  dimensions: {
    lengthM: { text: "2", uncertainty: lengthUncertainty },
    widthM: { text: "1" },
    heightM: { text: "1" },
  },
  fillDepth: { text: "0,5" },
  isAtSurface: true,
});
