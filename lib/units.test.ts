import fc from "fast-check";
import { unit as mathjsUnit } from "mathjs";
import { describe, expect, it } from "vitest";
import { nearlyEqual } from "./nearly";
import { acceptedUnits, canonicalValue, convert, matchUnit, UnitError, unitLabel } from "./units";
import { normaliseUnitText } from "./units/factors";
import { UNIT_TABLE, type UnitDefinition } from "./units/unit-table.data";

const plain = UNIT_TABLE.filter((unit) => !unit.needs);
const baseOf = (unit: UnitDefinition) => acceptedUnits(unit.dimension)[0]?.code ?? "";

function codeOf(act: () => unknown): string {
  try {
    act();
  } catch (error) {
    if (error instanceof UnitError) return error.code;
    throw error;
  }
  return "no error";
}

describe("the table of units", () => {
  it("has every code once and starts each dimension with its base", () => {
    expect(new Set(UNIT_TABLE.map((unit) => unit.code)).size).toBe(UNIT_TABLE.length);
    for (const dimension of new Set(UNIT_TABLE.map((unit) => unit.dimension))) {
      const base = acceptedUnits(dimension)[0];
      expect([base?.multiply ?? 1, base?.divide ?? 1, base?.zeroAt ?? 0, base?.needs]).toEqual([
        1,
        1,
        0,
        undefined,
      ]);
    }
  });

  it.each(plain.map((unit) => [unit.code, unit] as const))(
    "%s goes to its base and back unchanged",
    (code, unit) => {
      fc.assert(
        fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), (value) => {
          const there = convert(value, code, baseOf(unit));
          const back = convert(there, baseOf(unit), code);
          // an offset of 273.15 eats digits of very small numbers
          expect(nearlyEqual(back, value) || Math.abs(back - value) < 1e-10).toBe(true);
        }),
      );
    },
  );

  it.each(plain.map((unit) => [unit.code, unit] as const))("%s keeps the order of values", (code, unit) => {
    expect(convert(2, code, baseOf(unit))).toBeGreaterThan(convert(1, code, baseOf(unit)));
  });

  const physical = plain.filter((unit) => unit.expression);
  it.each(physical.map((unit) => [unit.code, unit] as const))(
    "%s agrees with the definition in mathjs",
    (code, unit) => {
      const base = acceptedUnits(unit.dimension)[0]?.expression;
      if (!base || !unit.expression) throw new Error(`${code} has no base in mathjs's words`);
      const expected = mathjsUnit(12.5, unit.expression).toNumber(base);
      expect(Math.abs(convert(12.5, code, baseOf(unit)) / expected - 1)).toBeLessThan(1e-8);
    },
  );
});

describe("what people type", () => {
  it.each([
    ["C", "temperature", "°C"],
    ["deg C", "temperature", "°C"],
    ["°c", "temperature", "°C"],
    ["℃", "temperature", "°C"],
    ["degrees F", "temperature", "°F"],
    ["ºF", "temperature", "°F"],
    ["ppt", "salinity", "psu"],
    ["PSU", "salinity", "psu"],
    ["sg 25/25", "salinity", "SG 25/25 °C"],
    ["SG 60/60F", "salinity", "SG 60/60 °F"],
    ["dkh", "alkalinity", "dKH"],
    ["°dKH", "alkalinity", "dKH"],
    ["meq/l", "alkalinity", "meq/L"],
    ["mg/l as CaCO₃", "alkalinity", "mg/L CaCO3"],
    ["mgl", "concentration", "mg/L"],
    ["ug/l", "concentration", "µg/L"],
    ["μg/L", "concentration", "µg/L"],
    ["uS/cm", "conductivity", "µS/cm"],
    ["M3/H", "flow", "m³/h"],
    ["gpm", "flow", "US gpm"],
    ["mg/L NO₃⁻N", "nitrate", "mg/L NO3-N"],
    ["cfu / 100 ml", "bacteria", "CFU/100 mL"],
    ["lux", "illuminance", "lx"],
  ] as const)("“%s” is understood as a unit of %s: %s", (typed, dimension, code) => {
    const among = acceptedUnits(dimension).map((unit) => unit.code);
    const match = matchUnit(typed, among);
    expect(match.state === "one" && match.unit.code).toBe(code);
  });

  it("a spelling that fits two bases is asked about, never guessed", () => {
    const match = matchUnit("mg/L", ["mg/L NO3", "mg/L NO3-N"]);
    expect(match.state === "several" && match.units.map((unit) => unit.code)).toEqual([
      "mg/L NO3",
      "mg/L NO3-N",
    ]);
    expect(() => canonicalValue(5, "ppm", "mg/L NO3", ["mg/L NO3", "mg/L NO3-N"])).toThrow(
      "“ppm” can mean mg/L NO3 or mg/L NO3-N. Write which one.",
    );
    expect(canonicalValue(5, "ppm", "mg/L NO3", ["mg/L NO3"])).toBe(5);
  });

  it("the code itself always finds its unit, in any case", () => {
    for (const unit of UNIT_TABLE) {
      const among = acceptedUnits(unit.dimension).map((each) => each.code);
      for (const typed of [unit.code, unit.code.toUpperCase(), ` ${unit.code.toLowerCase()} `]) {
        const match = matchUnit(typed, among);
        expect([typed, match.state === "one" ? match.unit.code : match.state]).toEqual([typed, unit.code]);
      }
    }
  });

  it("no alias takes another unit's own spelling within a dimension unless both are listed for it", () => {
    for (const unit of UNIT_TABLE) {
      for (const other of acceptedUnits(unit.dimension)) {
        if (other === unit) continue;
        const taken = unit.aliases.map(normaliseUnitText).includes(normaliseUnitText(other.code));
        expect([unit.code, other.code, taken]).toEqual([unit.code, other.code, false]);
      }
    }
  });

  it("shows the unit, and nothing for bare numbers", () => {
    expect(unitLabel("°C")).toBe("°C");
    expect(unitLabel("mS/cm (salinity)")).toBe("mS/cm");
    expect(unitLabel("pH")).toBe("");
    expect(unitLabel(null)).toBe("");
  });
});

describe("refusals", () => {
  it("unlike quantities, unknown units and units without a factor are refused with a sentence", () => {
    expect(codeOf(() => convert(1, "°C", "psu"))).toBe("different-kind");
    expect(codeOf(() => convert(1, "mg/L NO3-N", "mg/L"))).toBe("different-kind");
    expect(codeOf(() => convert(1, "cubit", "m"))).toBe("unknown-unit");
    expect(codeOf(() => convert(1.026, "SG 25/25 °C", "psu"))).toBe("needs-context");
    expect(codeOf(() => convert(2300, "µmol/kg", "meq/L"))).toBe("needs-context");
    expect(codeOf(() => convert(48, "mS/cm (salinity)", "psu"))).toBe("needs-context");
    expect(codeOf(() => convert(Number.NaN, "°C", "°F"))).toBe("not-a-number");
    expect(codeOf(() => convert(Number.POSITIVE_INFINITY, "kg", "ft^3"))).toBe("not-a-number");
  });

  it("only plain products of units pass to mathjs", () => {
    expect(convert(1, "ft^3/hour", "L/h")).toBeCloseTo(28.316846592, 9);
    for (const text of [
      "import({})",
      "createUnit('x')",
      "1+1",
      "m^99",
      "a".repeat(60),
      "evaluate",
      "kg;m",
      "",
    ]) {
      expect([text, codeOf(() => convert(1, text, "kg"))]).toEqual([text, "unknown-unit"]);
    }
    expect(codeOf(() => convert(1, "ft^3/hour", "kg"))).toBe("different-kind");
  });
});
