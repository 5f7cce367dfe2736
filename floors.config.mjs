/**
 * The floors of the house, high to low. A module imports from lower floors alone, and only through their doors.
 * Everything below is made from this one list; a folder under modules/ that is not in it is a breach.
 */
export const FLOORS = [
  ["reports"],
  ["imports"],
  ["production", "treatments", "assays"],
  ["movements"],
  ["quality"],
  ["rounds"],
  ["measurements"],
  ["systems", "methods"],
  ["signoff"],
  ["identity"],
  ["notifications"],
  ["audit"],
  ["access"],
  ["seawater", "statistics"],
];

/** Modules whose door opens in a browser too: what they export only computes. */
export const OPEN_DOORS = ["access", "seawater", "statistics"];

/** Modules of pure computation: no other module, no library of the house, no input or output. */
export const PURE = ["seawater", "statistics"];

/** The files of a module that others may import. */
export const DOORS = ["index", "model", "input"];

const any = (names) => `(${names.join("|")})`;
const moduleOf = (names) => `^modules/${any(names)}/`;
const npm = (name) => `(^|/)node_modules/${name}/`;
const LISTED = moduleOf(FLOORS.flat());
const DOOR = `^modules/[^/]+/${any(DOORS)}[.]tsx?$`;
const UI = "^modules/[^/]+/ui/";
const PURE_PACKAGES = ["mathjs", "simple-statistics", "zod"];
const SERVER_CORE = `^(node:)?(fs|child_process|worker_threads|net|tls|dgram|dns|http|https|os|path|cluster)(/|$)`;

const rule = (name, comment, from, to) => ({ name, comment, severity: "error", from, to });

/** One rule a floor: what stands on it may not look up, nor sideways at its neighbours. */
const directions = FLOORS.flatMap((floor, index) => {
  const above = FLOORS.slice(0, index).flat();
  const up = [`^app/`, ...(above.length > 0 ? [moduleOf(above)] : [])];
  const upward = rule(
    "upward-import",
    "A module imports lower floors only; what must go up goes as an event (app/_server/reactions.ts).",
    { path: moduleOf(floor) },
    { path: up },
  );
  if (floor.length === 1) return [upward];
  return [
    upward,
    rule(
      "sideways-import",
      "Modules on one floor do not know each other.",
      { path: moduleOf(floor) },
      { path: moduleOf(floor), pathNot: "^modules/$1/" },
    ),
  ];
});

/** Rules in which an import of a type counts as much as any other. */
const withTypes = [
  ...directions,
  rule(
    "past-the-door",
    "Another module is entered through its door alone: index, model or input. Reports may also read tables.",
    { path: "^modules/([^/]+)/", pathNot: "^modules/reports/" },
    { path: "^modules/", pathNot: ["^modules/$1/", DOOR] },
  ),
  rule(
    "past-the-door",
    "Reports enter through the doors and may read tables, nothing else.",
    { path: "^modules/reports/" },
    { path: "^modules/", pathNot: ["^modules/reports/", DOOR, "^modules/[^/]+/schema[.]ts$"] },
  ),
  rule(
    "past-the-door",
    "Routes enter a module through its door, or show its ui.",
    { path: "^app/" },
    { path: "^modules/", pathNot: [DOOR, UI] },
  ),
  rule(
    "past-the-door",
    "Seeds and command-line entries use the same doors as everybody.",
    { path: "^(db/seed|scripts)/" },
    { path: "^modules/", pathNot: [DOOR] },
  ),
  rule(
    "unlisted-module",
    "Every folder of modules/ has its floor in FLOORS.",
    { path: "^modules/[^/]+/", pathNot: LISTED },
    {},
  ),
  rule(
    "unlisted-module",
    "Every folder of modules/ has its floor in FLOORS.",
    {},
    { path: "^modules/[^/]+/", pathNot: LISTED },
  ),
  rule(
    "unlisted-module",
    "Every folder of modules/ has its floor in FLOORS.",
    { orphan: true, path: "^modules/[^/]+/", pathNot: LISTED },
    {},
  ),
  rule(
    "pure-stays-pure",
    "Pure computation imports nothing of the project, no framework and nothing that reads or writes.",
    { path: `^modules/${any(PURE)}/` },
    { pathNot: ["^modules/$1/", ...PURE_PACKAGES.map(npm)] },
  ),
  rule(
    "second-writer",
    "Only db and modules/audit hold a connection that writes; everybody else changes things by runCommand.",
    { pathNot: "^(db|modules/audit)/" },
    { path: ["^db/writer([.]ts|/)", npm("better-sqlite3"), "(^|/)node_modules/drizzle-orm/better-sqlite3/"] },
  ),
  rule(
    "second-writer",
    "The seed writes through commands like everybody.",
    { path: "^db/seed/" },
    { path: ["^db/writer([.]ts|/)", npm("better-sqlite3"), "(^|/)node_modules/drizzle-orm/better-sqlite3/"] },
  ),
  rule(
    "seed-stands-outside",
    "The seed uses the product; the product does not know the seed.",
    { pathNot: "^db/seed/" },
    { path: "^db/seed/" },
  ),
  rule(
    "lib-stays-below",
    "lib knows no word of the trade.",
    { path: "^lib/" },
    { path: "^(app|modules|db|scripts|tests)/" },
  ),
  rule(
    "db-stays-below",
    "db stands under the modules.",
    { path: "^db/", pathNot: "^db/seed/" },
    { path: "^(app|modules|scripts)/" },
  ),
  rule(
    "tests-stay-outside",
    "The product imports nothing of its tests.",
    { path: "^(app|modules|lib|db)/", pathNot: "^db/seed/" },
    { path: "^tests/" },
  ),
  rule("unresolvable", "What is imported exists.", {}, { couldNotResolve: true }),
];

/** Rules about what really runs: imports of types, gone after compilation, do not count. */
const atRunTime = [
  rule(
    "ui-reaches-server",
    "What a component pulls in, even through others, must be fit for a browser.",
    { path: [UI, "^lib/ui/"] },
    {
      path: [
        "^(db|app)/",
        "^modules/[^/]+/(schema[.]ts$|commands/|queries/)",
        SERVER_CORE,
        ...[
          "better-sqlite3",
          "drizzle-orm",
          "server-only",
          "pino",
          "nodemailer",
          "exceljs",
          "@node-rs/argon2",
        ].map(npm),
      ],
      reachable: true,
    },
  ),
  rule("cycle", "Two files that need each other are one file, or three.", {}, { circular: true }),
  rule(
    "dev-package-in-product",
    "What runs in production stands under dependencies.",
    { path: "^(app|modules|lib|db)/" },
    { dependencyTypes: ["npm-dev"] },
  ),
];

const options = {
  doNotFollow: { path: "node_modules" },
  exclude: { path: "[.]test[.]tsx?$|^[.]next/|^tests/fixtures/" },
  enhancedResolveOptions: {
    extensions: [".ts", ".tsx", ".mjs", ".js", ".json", ".css"],
    exportsFields: ["exports"],
    conditionNames: ["import", "require", "node", "default", "types"],
  },
};

/** The two walks of the project: with types, and as it runs. */
export const WALKS = [
  { title: "with types", forbidden: withTypes, options: { ...options, tsPreCompilationDeps: true } },
  { title: "as it runs", forbidden: atRunTime, options: { ...options, tsPreCompilationDeps: false } },
];
