import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { caseIds } from "./statistics-cases";

/** Reference cases that concern no statistic; what they ask for is shown by the tests of the modules named. */
const ELSEWHERE: Readonly<Record<string, string>> = {
  "electronic-records": "prose requirements on records and signatures: audit and signoff",
  "excel-serials": "date serials of spreadsheets: imports",
  "rfc4180-valid": "comma-separated text: imports",
  "rfc4180-invalid": "comma-separated text: imports",
  encodings: "byte order marks and encodings: imports",
  "decimal-comma": "number text under a locale: imports",
  "censored-parsing": "text of censored results: measurements and imports",
  "csv-injection": "escaping on export: reports and exports",
};

const folder = new URL("./", import.meta.url);
const sources = readdirSync(folder)
  .filter((name) => /^statistics-(?!coverage).*\.test\.ts$/.test(name))
  .map((name) => readFileSync(new URL(name, folder), "utf8"))
  .join("\n");

describe("every numeric reference case of statistics is checked", () => {
  it.each(caseIds)("%s is checked or listed with the reason why not", (id) => {
    const checked = sources.includes(`"${id}"`);
    expect(checked !== id in ELSEWHERE, `${id} is ${checked ? "checked and excluded" : "neither"}`).toBe(
      true,
    );
  });

  it("no exclusion names a case that does not exist", () => {
    expect(Object.keys(ELSEWHERE).filter((id) => !caseIds.includes(id))).toEqual([]);
  });
});
