import { describe, expect, it } from "vitest";
import { shownValue } from "./shown-value";

const number = { kind: "number", choices: [], decimals: 1, unit: "°C" } as const;
const plain = { value: 13.4, qualifier: "", answer: null, typedText: "13.4", typedUnit: "°C" } as const;

describe("a reading as it is shown", () => {
  it("has its figure and unit apart, and names what was typed only where the unit was another", () => {
    expect(shownValue(plain, number)).toEqual({ figure: "13.4", unit: "°C", asTyped: null });
    // 64.4 °F is 18 °C exactly: (64.4 − 32) × 5/9
    const fahrenheit = { ...plain, value: 18, typedText: "64.4", typedUnit: "°F" };
    expect(shownValue(fahrenheit, number)).toEqual({ figure: "18.0", unit: "°C", asTyped: "64.4 °F" });
  });

  it("keeps the qualifier and the digits of what is below a detection limit", () => {
    const below = { ...plain, value: 0.05, qualifier: "<", typedText: "<0.05" } as const;
    expect(shownValue(below, number).figure).toBe("<0.05");
  });

  it("of a choice is its label, of a text the text", () => {
    const choices = [{ code: "ok", label: "running", means: "within" }] as const;
    const answer = { ...plain, value: null, answer: "ok", typedText: "ok", typedUnit: null } as const;
    expect(shownValue(answer, { ...number, kind: "choice", choices, unit: null }).figure).toBe("running");
    const text = { ...answer, answer: "cloudy at the north end" };
    expect(shownValue(text, { ...number, kind: "text", unit: null }).figure).toBe("cloudy at the north end");
  });
});
