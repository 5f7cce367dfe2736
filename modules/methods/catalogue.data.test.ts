import { describe, expect, it } from "vitest";
import { getUnit } from "@/lib/units/factors";
import { PARAMETER_CATALOGUE } from "./catalogue.data";
import { PARAMETER_GROUPS, PARAMETER_KINDS } from "./model";

const numeric = PARAMETER_CATALOGUE.filter((each) => each.kind === "number" || each.kind === "count");

describe("the starter catalogue", () => {
  it("has at least 45 parameters, each code and name once, every kind and group used", () => {
    expect(PARAMETER_CATALOGUE.length).toBeGreaterThanOrEqual(45);
    expect(new Set(PARAMETER_CATALOGUE.map((each) => each.code)).size).toBe(PARAMETER_CATALOGUE.length);
    expect(new Set(PARAMETER_CATALOGUE.map((each) => each.name)).size).toBe(PARAMETER_CATALOGUE.length);
    expect(new Set(PARAMETER_CATALOGUE.map((each) => each.kind))).toEqual(new Set(PARAMETER_KINDS));
    expect(new Set(PARAMETER_CATALOGUE.map((each) => each.group))).toEqual(new Set(PARAMETER_GROUPS));
    for (const { code } of PARAMETER_CATALOGUE) expect(code).toMatch(/^[a-z][a-z0-9_]*$/);
  });

  it.each(numeric.map((each) => [each.code, each] as const))(
    "%s has known units of one kind",
    (_, parameter) => {
      expect(parameter.unit).not.toBeNull();
      const canonical = getUnit(parameter.unit ?? "");
      expect(canonical.needs).toBeUndefined();
      expect(parameter.acceptedUnits).toContain(canonical.code);
      expect(new Set(parameter.acceptedUnits).size).toBe(parameter.acceptedUnits.length);
      for (const code of parameter.acceptedUnits) expect(getUnit(code).dimension).toBe(canonical.dimension);
    },
  );

  it.each(numeric.map((each) => [each.code, each] as const))(
    "%s has plausible bounds in order",
    (_, parameter) => {
      const { low, high } = parameter.plausible;
      expect(low).toBeLessThan(high ?? Number.NaN);
      expect((low ?? 0) < 0).toBe(parameter.mayBeNegative);
      if (parameter.kind === "count") expect(parameter.decimals).toBe(0);
    },
  );

  it("answers have codes once and at least one good one; yes/no has exactly yes and no", () => {
    for (const parameter of PARAMETER_CATALOGUE) {
      const codes = parameter.choices.map((choice) => choice.code);
      expect(new Set(codes).size).toBe(codes.length);
      if (parameter.kind === "yes-no") expect(codes).toEqual(["yes", "no"]);
      if (parameter.kind === "choice") expect(codes.length).toBeGreaterThan(1);
      const answered = parameter.kind === "yes-no" || parameter.kind === "choice";
      expect(parameter.choices.some((choice) => choice.means === "within")).toBe(answered);
    }
  });

  it("standard seawater at 25 °C and the published composition are plausible", () => {
    // Surface seawater at S 35: Ca 412, Mg 1280, K 399 mg/L; pH 8.1; alkalinity 2.3-2.4 meq/L (Millero et al. 2008)
    const typical = {
      temperature: 25,
      salinity: 35,
      ph_nbs: 8.1,
      calcium: 412,
      magnesium: 1280,
      potassium: 399,
      alkalinity: 2.36,
    };
    for (const [code, value] of Object.entries(typical)) {
      const bounds = PARAMETER_CATALOGUE.find((each) => each.code === code)?.plausible;
      expect([code, value >= (bounds?.low ?? Infinity) && value <= (bounds?.high ?? -Infinity)]).toEqual([
        code,
        true,
      ]);
    }
  });
});
