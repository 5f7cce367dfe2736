import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseNumber } from "./parse-number";
import { parseValue, type ValueShape } from "./parse-value";

const number: ValueShape = { kind: "number" };
const count: ValueShape = { kind: "count" };

function read(text: string, shape: ValueShape = number) {
  const parsed = parseValue(text, shape);
  return parsed.ok ? [parsed.qualifier, parsed.value] : parsed.code;
}

describe("numbers as people type them", () => {
  it.each([
    ["8.12", "", 8.12],
    ["8,12", "", 8.12],
    [" 8.12 ", "", 8.12],
    ["\u00a08.12\u202f", "", 8.12],
    ["+3", "", 3],
    ["-1.5", "", -1.5],
    ["\u22121,5", "", -1.5],
    ["\u2013 1.5", "", -1.5],
    ["0", "", 0],
    ["-0", "", 0],
    [".5", "", 0.5],
    ["5.", "", 5],
    ["1.026", "", 1.026],
    ["0,234", "", 0.234],
    ["1234,567", "", 1234.567],
    ["1,2345", "", 1.2345],
    ["1,234.5", "", 1234.5],
    ["1.234,5", "", 1234.5],
    ["1 234,5", "", 1234.5],
    ["1\u202f234", "", 1234],
    ["1'234.5", "", 1234.5],
    ["1’234", "", 1234],
    ["1,234,567", "", 1234567],
    ["1.234.567", "", 1234567],
    ["1e3", "", 1000],
    ["1,5E-3", "", 0.0015],
    ["<0.05", "<", 0.05],
    ["< 0,05", "<", 0.05],
    ["<\u00a00.05", "<", 0.05],
    [">200", ">", 200],
    ["> \u22125", ">", -5],
    ["ND", "ND", null],
    ["n.d.", "ND", null],
    ["nd", "ND", null],
    ["N.D", "ND", null],
    ["not detected", "ND", null],
    ["<LOD", "ND", null],
    ["< LOQ", "<", null],
    ["TNTC", ">", null],
    ["Too numerous to count", ">", null],
  ])("“%s” is %s%s", (text, qualifier, value) => {
    expect(read(text)).toEqual([qualifier, value]);
  });

  it("the text as typed is kept", () => {
    const parsed = parseValue(" <0,05 ", number);
    expect(parsed.ok && parsed.text).toBe("<0,05");
  });

  it("a comma before three digits is refused with both meanings, and declared separators decide it", () => {
    const parsed = parseValue("1,234", number);
    expect(parsed).toEqual({
      ok: false,
      code: "ambiguous",
      sentence: "“1,234” can mean 1.234 or 1234. Write 1.234 with a point, or 1234 without the comma.",
    });
    expect(read("<12,345")).toBe("ambiguous");
    expect(read("-12,345")).toBe("ambiguous");
    expect(parseValue("1,234", number, ",")).toMatchObject({ ok: true, value: 1.234 });
    expect(parseValue("1,234", number, ".")).toMatchObject({ ok: true, value: 1234 });
    expect(parseValue("1.234", number, ",")).toMatchObject({ ok: true, value: 1234 });
    expect(parseValue("8.12", number, ",")).toMatchObject({ ok: false });
  });

  it.each([
    "abc",
    "8.1.2",
    "1,2,3",
    "1 2",
    "12 34",
    "--5",
    "<",
    "<<5",
    "<>5",
    "5-",
    "1e",
    "0x10",
    "Infinity",
    "NaN",
    "1'23",
  ])("“%s” is no number", (text) => {
    expect(read(text)).toBe("not-a-number");
  });

  it("refuses what is empty, too large, too long, compared with =, or carries a unit, each with its own sentence", () => {
    expect(read("")).toBe("empty");
    expect(read(" \u00a0 ")).toBe("empty");
    expect(read("1e999")).toBe("too-large");
    expect(read("1".repeat(61))).toBe("not-a-number");
    expect(read("x".repeat(3000))).toBe("too-long");
    expect(read("8\u00001")).toBe("control-characters");
    const sentence = (text: string) => {
      const parsed = parseValue(text, number);
      return parsed.ok ? "" : parsed.sentence;
    };
    expect(sentence("≤0.05")).toContain("Write < or > alone");
    expect(sentence("<=0.05")).toContain("Write < or > alone");
    expect(sentence("8.1 mg/L")).toContain("Write the number alone");
    expect(sentence("hello")).toContain("is not a number");
  });

  it("a decimal comma and a decimal point give the same value, or the comma is asked about", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 99999 }),
        fc.stringMatching(/^[0-9]{1,6}$/),
        (whole, fraction) => {
          const point = parseNumber(`${whole}.${fraction}`);
          const comma = parseNumber(`${whole},${fraction}`);
          expect(point).toEqual({ ok: true, value: Number(`${whole}.${fraction}`) });
          if (comma.ok) expect(comma).toEqual(point);
          else
            expect([comma.code, fraction.length, whole > 0 && whole < 1000]).toEqual(["ambiguous", 3, true]);
        },
      ),
    );
  });

  it("every finite number written by a computer reads back as itself", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const parsed = parseNumber(String(value));
        expect(parsed).toEqual({ ok: true, value: value === 0 ? 0 : value });
      }),
    );
  });

  it("no text at all makes it throw, or makes a number of ND", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary" }), (text) => {
        const parsed = parseValue(text, number);
        if (parsed.ok && parsed.qualifier === "ND") expect(parsed.value).toBeNull();
        if (parsed.ok && parsed.value !== null) expect(Number.isFinite(parsed.value)).toBe(true);
      }),
    );
  });
});

describe("counts, answers and texts", () => {
  it("a count is whole and not below nothing", () => {
    expect(read("12", count)).toEqual(["", 12]);
    expect(read("12.0", count)).toEqual(["", 12]);
    expect(read("<1", count)).toEqual(["<", 1]);
    expect(read("TNTC", count)).toEqual([">", null]);
    expect(read("1.5", count)).toBe("not-whole");
    expect(read("-3", count)).toBe("negative-count");
  });

  it("yes and no are understood as people write them", () => {
    for (const text of ["yes", "Y", "TRUE", "1", "on"])
      expect(read(text, { kind: "yes-no" })).toEqual(["", 1]);
    for (const text of ["no", "N", "false", "0", "OFF"])
      expect(read(text, { kind: "yes-no" })).toEqual(["", 0]);
    expect(read("maybe", { kind: "yes-no" })).toBe("not-an-answer");
    expect(parseValue("Y", { kind: "yes-no" })).toMatchObject({ text: "yes" });
  });

  it("a choice is found by code or label and stored as its code", () => {
    const choices = [
      { code: "clear", label: "Clear" },
      { code: "slightly-cloudy", label: "Slightly cloudy" },
    ];
    expect(parseValue("slightly CLOUDY", { kind: "choice", choices })).toEqual({
      ok: true,
      qualifier: "",
      value: null,
      text: "slightly-cloudy",
    });
    const refused = parseValue("murky", { kind: "choice", choices });
    expect(refused.ok ? "" : refused.sentence).toContain("Choose one of: Clear, Slightly cloudy.");
  });

  it("a text keeps its words and its lines", () => {
    expect(parseValue("  two lines\nof text ", { kind: "text" })).toMatchObject({
      text: "two lines\nof text",
    });
    expect(read("   ", { kind: "text" })).toBe("empty");
  });
});
