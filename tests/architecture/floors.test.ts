import { fileURLToPath } from "node:url";
import { beforeAll, describe, expect, it } from "vitest";
import { walkFloors } from "../../scripts/walk-floors.mjs";

const project = fileURLToPath(new URL("../..", import.meta.url));
const planted = fileURLToPath(new URL("../fixtures/floors", import.meta.url));

/** Every breach planted under tests/fixtures/floors: the rule that must name it, the file, what it reaches for. */
const PLANTED: [rule: string, from: string, to: RegExp][] = [
  ["upward-import", "modules/systems/rules/planted-upward.ts", /^modules\/measurements\/index\.ts$/],
  ["upward-import", "modules/systems/rules/planted-upward-type.ts", /^modules\/measurements\/model\.ts$/],
  ["upward-import", "modules/measurements/rules/planted-upward-app.ts", /^app\/page\.tsx$/],
  ["sideways-import", "modules/methods/rules/planted-sideways.ts", /^modules\/systems\/index\.ts$/],
  ["sideways-import", "modules/statistics/planted-neighbour.ts", /^modules\/seawater\/index\.ts$/],
  ["past-the-door", "modules/measurements/rules/planted-deep.ts", /^modules\/systems\/rules\/name\.ts$/],
  [
    "past-the-door",
    "modules/measurements/queries/planted-foreign-table.ts",
    /^modules\/systems\/schema\.ts$/,
  ],
  ["past-the-door", "modules/measurements/ui/planted-foreign-ui.tsx", /^modules\/systems\/ui\/card\.tsx$/],
  ["past-the-door", "modules/reports/planted-deep.ts", /^modules\/systems\/rules\/name\.ts$/],
  ["past-the-door", "app/planted-deep.ts", /^modules\/systems\/queries\/list-systems\.ts$/],
  ["past-the-door", "db/seed/planted-deep.ts", /^modules\/systems\/rules\/name\.ts$/],
  ["ui-reaches-server", "modules/measurements/ui/planted-direct.tsx", /^db\/connection\.ts$/],
  ["ui-reaches-server", "modules/measurements/ui/planted-direct.tsx", /node_modules\/better-sqlite3\//],
  ["ui-reaches-server", "modules/measurements/ui/planted-direct.tsx", /^path$/],
  ["ui-reaches-server", "modules/measurements/ui/planted-transitive.tsx", /^fs$/],
  ["cycle", "modules/measurements/rules/planted-cycle-a.ts", /planted-cycle-b\.ts$/],
  ["unlisted-module", "modules/planted-unlisted/index.ts", /^lib\/problem\.ts$/],
  ["unlisted-module", "modules/planted-orphan/index.ts", /^modules\/planted-orphan\/index\.ts$/],
  ["pure-stays-pure", "modules/seawater/planted-lib.ts", /^lib\/problem\.ts$/],
  ["pure-stays-pure", "modules/statistics/planted-core.ts", /^fs$/],
  ["pure-stays-pure", "modules/statistics/planted-framework.ts", /node_modules\/react\//],
  ["pure-stays-pure", "modules/statistics/planted-neighbour.ts", /^modules\/seawater\/index\.ts$/],
  ["second-writer", "modules/systems/commands/planted-second-writer.ts", /node_modules\/better-sqlite3\//],
  ["second-writer", "modules/systems/commands/planted-second-orm.ts", /drizzle-orm\/better-sqlite3\//],
  ["second-writer", "app/planted-writer.ts", /^db\/writer\.ts$/],
  ["seed-stands-outside", "modules/systems/rules/planted-seed.ts", /^db\/seed\/run\.ts$/],
  ["lib-stays-below", "lib/planted-trade.ts", /^modules\/seawater\/index\.ts$/],
  ["db-stays-below", "db/planted-module.ts", /^modules\/systems\/index\.ts$/],
  ["tests-stay-outside", "app/planted-test-code.ts", /^tests\/support\/builder\.ts$/],
  ["unresolvable", "app/planted-missing.ts", /nowhere$/],
  ["dev-package-in-product", "app/planted-dev-package.ts", /node_modules\/fast-check\//],
];

type Breach = Awaited<ReturnType<typeof walkFloors>>["breaches"][number];
const line = (breach: Breach) => `${breach.rule}: ${breach.from} → ${breach.to}`;
const isPlanted = (breach: Breach) =>
  PLANTED.some(([rule, from, to]) => breach.rule === rule && breach.from === from && to.test(breach.to));

describe("the floors", () => {
  it("the project breaches none", async () => {
    const walk = await walkFloors(project);
    expect(walk.files).toBeGreaterThan(40);
    expect(walk.breaches.map(line)).toEqual([]);
  });
});

describe("planted breaches", () => {
  let breaches: Breach[] = [];
  beforeAll(async () => {
    breaches = (await walkFloors(planted)).breaches;
  });

  it.each(PLANTED)("%s catches %s reaching %s", (rule, from, to) => {
    const caught = breaches.filter(
      (breach) => breach.rule === rule && breach.from === from && to.test(breach.to),
    );
    expect(caught, breaches.map(line).join("\n")).toHaveLength(1);
  });

  it("nothing sound is accused", () => {
    expect(breaches.filter((breach) => !isPlanted(breach)).map(line)).toEqual([]);
  });

  it("a breach through others names the way", () => {
    const through = breaches.find(({ from }) => from.endsWith("planted-transitive.tsx"));
    expect(through?.via).toEqual([
      "modules/measurements/rules/planted-first-step.ts",
      "modules/measurements/rules/planted-second-step.ts",
      "fs",
    ]);
  });
});
