import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { acceptedUnits } from "@/lib/units/factors";
import { convertReading } from "./convert-reading";

const context = { sampleTemperatureC: 22, salinityPsu: 34 };
const special = [...acceptedUnits("salinity"), ...acceptedUnits("alkalinity")].filter((unit) => unit.needs);

function value(...input: Parameters<typeof convertReading>): number {
  const converted = convertReading(...input);
  if (!converted.ok) throw new Error(converted.sentence);
  return converted.value;
}

describe("converting readings", () => {
  it.each(special.map((unit) => [unit.code, unit.dimension] as const))(
    "%s goes there and back",
    (code, dimension) => {
      const base = dimension === "salinity" ? "psu" : "meq/L";
      const range = dimension === "salinity" ? { min: 5, max: 40 } : { min: 0.1, max: 10 };
      fc.assert(
        fc.property(fc.double({ ...range, noNaN: true }), (start) => {
          const there = value(start, base, code, context);
          expect(value(there, code, base, context)).toBeCloseTo(start, 6);
        }),
      );
    },
  );

  it("plain units go by their factor, whatever the context", () => {
    expect(value(64.4, "°F", "°C")).toBeCloseTo(18, 12);
    expect(value(35, "psu", "psu")).toBe(35);
  });

  it("says what is missing, and what lies outside the formulas", () => {
    expect(convertReading(53, "mS/cm (salinity)", "psu")).toMatchObject({ ok: false, code: "needs-context" });
    expect(convertReading(2300, "µmol/kg", "meq/L", { salinityPsu: 35 })).toMatchObject({
      code: "needs-context",
    });
    const typo = convertReading(35, "SG 25/25 °C", "psu");
    expect(typo).toMatchObject({ ok: false, code: "out-of-range" });
    expect(typo.ok ? "" : typo.sentence).toContain("Check the value and its unit.");
    expect(convertReading(1, "psu", "°C")).toMatchObject({ code: "different-kind" });
    expect(convertReading(1, "µmol/kg", "psu", context)).toMatchObject({ code: "different-kind" });
    expect(convertReading(1, "psu", "furlong")).toMatchObject({ code: "unknown-unit" });
    expect(convertReading(Number.NaN, "SG 25/25 °C", "psu")).toMatchObject({ code: "not-a-number" });
  });
});
