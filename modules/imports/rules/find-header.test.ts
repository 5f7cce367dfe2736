import { describe, expect, it } from "vitest";
import type { RawCell, RawRow } from "@/modules/imports/model";
import { columnLetter, findHeader, type HeaderResult, splitUnit } from "@/modules/imports/rules/find-header";

const KNOWN = [
  { code: "TEMP", names: ["Temperature"] },
  { code: "PH", names: ["pH"] },
  { code: "SAL", names: ["Salinity"] },
];
const rows = (...table: RawCell[][]): RawRow[] => table.map((cells, index) => ({ line: index + 1, cells }));
const find = (...table: RawCell[][]): HeaderResult => findHeader(rows(...table), KNOWN);

function uses(result: HeaderResult) {
  if (result.kind !== "found") throw new Error(result.refusal.reason);
  return result.columnMap.columns.map(({ use }) =>
    use.kind === "field" ? use.field : use.kind === "parameter" ? [use.parameter, use.unit] : "unknown",
  );
}

describe("findHeader", () => {
  it("reads the long form in any order and case and by other words", () => {
    expect(
      uses(find(["RESULT", "taken_by", "Units", "ANALYTE", "Tank", "Sampling point", "Date/Time"])),
    ).toEqual(["value", "takenBy", "unit", "parameter", "system", "point", "moment"]);
    expect(find(["Value", "Parameter", "System", "Taken at"])).toMatchObject({ columnMap: { form: "long" } });
  });

  it("reads the wide form by parameter names, codes and units in brackets", () => {
    const wide = find(["System", "Date", "Time", "temperature (°C)", "PH", "Redox [mV]", "Weather"]);
    expect(uses(wide)).toEqual([
      "system",
      "date",
      "time",
      ["TEMP", "°C"],
      ["PH", null],
      ["Redox", "mV"],
      "unknown",
    ]);
    expect(wide).toMatchObject({ columnMap: { form: "wide" } });
  });

  it("passes over titles above the header", () => {
    const found = find(
      ["Weekly water report"],
      [null, null],
      ["System", "Parameter", "Value", "Date", "Time"],
    );
    expect(found).toMatchObject({ rowIndex: 2, columnMap: { headerLine: 3 } });
  });

  it("takes a lone column Time for the whole moment", () => {
    expect(uses(find(["System", "Time", "pH"]))).toEqual(["system", "moment", ["PH", null]]);
  });

  it("names headers that stand twice, and headers that mean the same", () => {
    const twice = find(["System", "pH", "Date", "Time", "PH "]);
    expect(twice).toMatchObject({ kind: "refused", refusal: { code: "duplicate-headers", line: 1 } });
    expect(JSON.stringify(twice)).toContain("“pH” stands in columns B and E");
    const same = find(["System", "Parameter", "Value", "Result", "Taken at"]);
    expect(JSON.stringify(same)).toContain("“Value” and “Result” (columns C and D) mean the same");
    const units = find(["System", "Taken at", "Temperature (°C)", "Temperature (°F)"]);
    expect(units).toMatchObject({ kind: "refused", refusal: { code: "duplicate-headers" } });
  });

  it("says what a header needs when there is none, and when the time is missing", () => {
    expect(find(["KELP-01", 8.1], ["KELP-01", 8.2])).toMatchObject({ refusal: { code: "no-header" } });
    const timeless = find(["System", "Parameter", "Value"]);
    expect(JSON.stringify(timeless)).toContain("no column for the date and time");
  });
});

it("names columns as spreadsheets do", () => {
  expect([0, 25, 26, 51, 52, 701, 702].map(columnLetter)).toEqual(["A", "Z", "AA", "AZ", "BA", "ZZ", "AAA"]);
});

it("parts a unit from its name", () => {
  expect(splitUnit("Alkalinity (mg/L CaCO₃)")).toEqual({ name: "Alkalinity", unit: "mg/L CaCO₃" });
  expect(splitUnit("pH")).toEqual({ name: "pH", unit: null });
});
