import { fileURLToPath } from "node:url";
import react from "@vitejs/plugin-react";
import { configDefaults, defineConfig } from "vitest/config";

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** What every project shares: the `@/` alias, `server-only` answered by an empty file, no stray console.error. */
const shared = {
  plugins: [react()],
  resolve: {
    alias: [
      { find: /^server-only$/, replacement: at("./tests/support/server-only.ts") },
      { find: /^@\//, replacement: at("./") },
    ],
  },
};
const setupFiles = [at("./tests/support/console-error.ts")];
const exclude = [...configDefaults.exclude, "**/.next/**", "build/**", "tests/fixtures/**"];
const beside = (ext: string) => [`{lib,modules,app,db,scripts}/**/*.test.${ext}`];

export default defineConfig({
  test: {
    maxWorkers: 2,
    projects: [
      {
        ...shared,
        test: { name: "unit", environment: "node", include: beside("ts"), exclude, setupFiles },
      },
      {
        ...shared,
        test: {
          name: "unit-dom",
          environment: "jsdom",
          include: beside("tsx"),
          exclude,
          setupFiles: [...setupFiles, at("./tests/support/dom.ts")],
        },
      },
      {
        ...shared,
        test: {
          name: "published",
          environment: "node",
          include: ["tests/published/**/*.test.ts"],
          exclude,
          setupFiles,
        },
      },
      {
        ...shared,
        test: {
          name: "integration",
          environment: "node",
          include: ["tests/integration/**/*.test.ts"],
          exclude,
          setupFiles,
          testTimeout: 20_000,
          hookTimeout: 60_000,
        },
      },
      {
        ...shared,
        test: {
          name: "access",
          environment: "node",
          include: ["tests/access/**/*.test.ts"],
          exclude,
          setupFiles,
          globalSetup: [at("./tests/access/global-setup.ts")],
          testTimeout: 60_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
      {
        ...shared,
        test: {
          name: "architecture",
          environment: "node",
          include: ["tests/architecture/**/*.test.ts"],
          exclude,
          setupFiles,
          testTimeout: 120_000,
        },
      },
    ],
  },
});
