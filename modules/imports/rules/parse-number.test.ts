import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { decimalEvidence, parseValue } from "@/modules/imports/rules/parse-number";

const number = (text: string, decimal: "point" | "comma" | null = null) => {
  const found = parseValue(text, decimal);
  return found.kind === "value" && found.value.kind === "number" ? found.value.number : found.kind;
};

describe("decimalEvidence", () => {
  // The rule that one decimal sign holds per file and 1.234 and 1,234 are ambiguous: common practice, no source.
  it("tells what a text shows about the decimal sign", () => {
    const seen = [
      "8.12",
      "8,12",
      "1.234",
      "1,234",
      "0.123",
      "1.234,5",
      "1,234.5",
      "12345",
      "1.234.567",
      "pH",
      "-0,3",
    ];
    expect(seen.map(decimalEvidence)).toEqual([
      "point",
      "comma",
      "ambiguous",
      "ambiguous",
      "point",
      "comma",
      "point",
      "either",
      "comma",
      "no-number",
      "comma",
    ]);
  });
});

describe("parseValue", () => {
  it("reads numbers with point or comma, groups, minus signs and powers of ten", () => {
    expect(["8.12", "8,12", "-0.3", "\u22120,3", "+4", "1e-3", ".5"].map((text) => number(text))).toEqual([
      8.12, 8.12, -0.3, -0.3, 4, 0.001, 0.5,
    ]);
    expect(["1\u00A0234,5", "1'234.5", "12\u202F345", "1 234.567"].map((text) => number(text))).toEqual([
      1234.5, 1234.5, 12345, 1234.567,
    ]);
  });

  it("does not choose between two numbers until the file's sign is known", () => {
    expect(parseValue("1.025", null)).toEqual({ kind: "ambiguous", asPoint: 1.025, asComma: 1025 });
    expect([number("1.025", "point"), number("1.025", "comma")]).toEqual([1.025, 1025]);
  });

  it("does not read a number against the file's sign", () => {
    expect([number("8,12", "point"), number("8.12", "comma"), number("8", "comma")]).toEqual([
      "wrong-sign",
      "wrong-sign",
      8,
    ]);
  });

  it("keeps the relation and the qualifier apart from the number", () => {
    expect(parseValue("< 0,05", "comma")).toMatchObject({
      value: { number: 0.05, relation: "<", qualifier: null },
    });
    expect(parseValue(">200", null)).toMatchObject({ value: { number: 200, relation: ">" } });
    expect(parseValue("≤0.05", null)).toMatchObject({ value: { relation: "<", qualifier: "≤" } });
  });

  // Source: EPA data qualifiers: U not detected (the value is the limit), J estimated, UJ the limit is estimated.
  it("reads laboratory qualifiers behind a number", () => {
    const parts = (text: string) => parseValue(text, null);
    expect(parts("0.05 U")).toMatchObject({ value: { number: 0.05, relation: "<", qualifier: "U" } });
    expect(parts("0.12 J")).toMatchObject({ value: { number: 0.12, relation: null, qualifier: "J" } });
    expect(parts("0.05UJ")).toMatchObject({ value: { kind: "text" } });
    expect(parts("0.05 UJ")).toMatchObject({ value: { relation: "<", qualifier: "UJ" } });
  });

  it("never makes a number of what was not measured, and leaves a reported 0 a number", () => {
    for (const text of ["ND", "n.d.", "<LOD", "BDL", "Not detected"]) {
      expect(parseValue(text, null)).toMatchObject({
        value: { kind: "unquantified", relation: "<", qualifier: text },
      });
    }
    expect(parseValue("TNTC", null)).toMatchObject({ value: { kind: "unquantified", relation: ">" } });
    expect(number("0")).toBe(0);
  });

  it("leaves texts texts and refuses a number beyond all bounds", () => {
    for (const text of ["clear", "8..1", "1.2.3", "8.1 mg/L", "2026-03-14", "-", "."]) {
      expect(parseValue(text, null)).toEqual({ kind: "value", value: { kind: "text", text } });
    }
    expect(number("1e999")).toBe("out-of-range");
  });

  it("reads back any number that was written with either sign", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const text = String(value);
        expect(number(text, "point")).toBe(value === 0 ? Number(text) : value);
        expect(number(text.replace(".", ","), "comma")).toBe(value === 0 ? Number(text) : value);
      }),
    );
  });
});
