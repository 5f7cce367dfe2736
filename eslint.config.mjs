import { defineConfig, globalIgnores } from "eslint/config";
import nextVitals from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";
import tseslint from "typescript-eslint";

const noDefaultExport = {
  selector: "ExportDefaultDeclaration",
  message:
    "Export by name. Default exports are for app/ and tool configs, where the framework asks for them.",
};
const noStarInDoor = {
  selector: "ExportAllDeclaration",
  message: "Name what you export: a door that exports everything is no door.",
};
const noHiddenInputs = [
  {
    selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    message: "The clock is passed in: take the moment from the context or an argument.",
  },
  {
    selector: "NewExpression[callee.name='Date'][arguments.length=0]",
    message: "The clock is passed in: take the moment from the context or an argument.",
  },
  {
    selector: "CallExpression[callee.name='Date'][arguments.length=0]",
    message: "The clock is passed in: take the moment from the context or an argument.",
  },
  {
    selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']",
    message: "Chance is passed in, so that a result can be had twice.",
  },
];
const noWriter = [
  "MemberExpression[property.name='writer']",
  "ObjectPattern > Property[key.name='writer']",
].map((selector) => ({
  selector,
  message: "Only modules/audit writes: change things by a command (runCommand).",
}));
const noEnv = { object: "process", property: "env", message: "Settings are read once, in lib/env.ts." };

const CONFIGS = ["*.config.{ts,mjs,js}", ".dependency-cruiser.mjs"];
const TESTS = ["**/*.test.{ts,tsx}", "tests/**"];

export default defineConfig([
  globalIgnores([
    ".next/**",
    "build/**",
    "data/**",
    "public/**",
    "next-env.d.ts",
    "db/migrations/**",
    "tests/fixtures/**",
    "test-results/**",
  ]),
  ...nextVitals,
  ...nextTypescript,
  {
    name: "stillwell/everything",
    files: ["**/*.{ts,tsx,mjs}"],
    linterOptions: { reportUnusedDisableDirectives: "error" },
    rules: {
      "no-restricted-syntax": ["error", noDefaultExport],
      "no-restricted-properties": ["error", noEnv],
      "no-restricted-imports": [
        "error",
        {
          paths: ["node:process", "process"].map((name) => ({
            name,
            importNames: ["env"],
            message: noEnv.message,
          })),
        },
      ],
      "max-lines": ["error", { max: 300 }],
      "max-lines-per-function": ["error", { max: 50, skipBlankLines: true, skipComments: true }],
      eqeqeq: ["error", "always", { null: "ignore" }],
      "no-console": ["error", { allow: ["error"] }],
      "import/no-anonymous-default-export": "off",
      "react/no-unescaped-entities": "off",
    },
  },
  {
    name: "stillwell/typed",
    files: ["**/*.{ts,tsx}"],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    plugins: { "@typescript-eslint": tseslint.plugin },
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-floating-promises": "error",
      "@typescript-eslint/no-misused-promises": ["error", { checksVoidReturn: { attributes: false } }],
      "@typescript-eslint/await-thenable": "error",
      "@typescript-eslint/only-throw-error": "error",
      "@typescript-eslint/switch-exhaustiveness-check": [
        "error",
        { considerDefaultExhaustiveForUnions: true },
      ],
      "@typescript-eslint/consistent-type-imports": ["error", { fixStyle: "separate-type-imports" }],
      "@typescript-eslint/no-unused-vars": [
        "error",
        { argsIgnorePattern: "^_", varsIgnorePattern: "^_", caughtErrorsIgnorePattern: "^_" },
      ],
    },
  },
  {
    name: "stillwell/components",
    files: ["**/*.tsx"],
    rules: { "max-lines-per-function": ["error", { max: 200, skipBlankLines: true, skipComments: true }] },
  },
  {
    name: "stillwell/modules",
    files: ["modules/**/*.{ts,tsx}"],
    rules: {
      "no-restricted-syntax": ["error", noDefaultExport, noStarInDoor, ...noWriter, ...noHiddenInputs],
    },
  },
  {
    name: "stillwell/the one module that writes",
    files: ["modules/audit/**/*.ts"],
    rules: { "no-restricted-syntax": ["error", noDefaultExport, noStarInDoor, ...noHiddenInputs] },
  },
  {
    name: "stillwell/default exports where a framework asks for them",
    files: [...CONFIGS, "tests/browser/global-setup.ts"],
    rules: { "no-restricted-syntax": "off" },
  },
  {
    name: "stillwell/routes",
    files: ["app/**/*.{ts,tsx}"],
    rules: { "no-restricted-syntax": ["error", ...noWriter] },
  },
  {
    name: "stillwell/where settings are read",
    // The framework itself says in NEXT_RUNTIME where instrumentation.ts runs, and reads it while it bundles.
    files: ["lib/env.ts", "lib/env.test.ts", "instrumentation.ts", "scripts/**", "tests/**", ...CONFIGS],
    rules: { "no-restricted-properties": "off", "no-restricted-imports": "off" },
  },
  {
    name: "stillwell/command-line entries speak to a terminal",
    files: ["scripts/**", "tests/bench/**", "db/seed/**"],
    rules: { "no-console": "off" },
  },
  {
    name: "stillwell/where there is no React, a name that begins with use is no hook",
    files: ["tests/support/*.ts", "tests/integration/**", "scripts/**", "db/**", "lib/*.ts"],
    rules: { "react-hooks/rules-of-hooks": "off" },
  },
  {
    name: "stillwell/long by nature",
    files: ["**/*.data.{ts,mjs}", ...TESTS],
    rules: { "max-lines": "off", "max-lines-per-function": "off" },
  },
]);
