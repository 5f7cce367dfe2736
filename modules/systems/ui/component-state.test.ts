import { describe, expect, it } from "vitest";
import type { TypedComponent } from "../model";
import { newComponent, readingOf, runningTotal, withShape } from "./component-state";

const units = { length: "m", volume: "L" } as const;
const exact = (text: string) => ({ text, uncertainty: "" });
const box = (more: Partial<TypedComponent> = {}): TypedComponent => ({
  ...newComponent(units, false),
  name: "basin",
  dimensions: { lengthM: exact("2"), widthM: exact("1"), heightM: exact("1") },
  ...more,
});

describe("the component editor", () => {
  it("keeps what two shapes share when the shape changes, and drops a depth that has no meaning", () => {
    const lying = withShape(box({ fillDepth: exact("0.5"), isAtSurface: true }), "lying-cylinder");
    expect(lying.dimensions).toEqual({ lengthM: exact("2") });
    expect(lying.fillDepth).toEqual(exact("0.5"));
    const litres = withShape(lying, "free-litres");
    expect(litres).toMatchObject({ dimensions: {}, fillDepth: null, isAtSurface: false });
  });

  it("names every empty field at once as untouched, and a wrong one as a mistake at its own path", () => {
    const begun = readingOf(newComponent(units, true)).problems;
    expect(begun.map((each) => each.path)).toEqual([
      "dimensions.lengthM",
      "dimensions.widthM",
      "dimensions.heightM",
      "fillDepth",
    ]);
    expect(begun.every((each) => each.isUntouched)).toBe(true);
    const wrong = box({ dimensions: { ...box().dimensions, widthM: exact("wide") } });
    expect(readingOf(wrong).problems).toMatchObject([{ path: "dimensions.widthM", isUntouched: false }]);
    const deep = box({ fillDepth: exact("1.5") });
    expect(readingOf(deep).problems).toMatchObject([{ path: "fillDepth", isUntouched: false }]);
  });

  // By hand: 2 × 1 × 1 m = 2,000 L, half of it 1,000 L.
  it("sums what can be read and says how much cannot", () => {
    const all = [box(), box({ fillDepth: exact("0,5"), isAtSurface: true }), newComponent(units, false)];
    const { total, surfaceAreaM2, unread } = runningTotal(all, 0);
    expect(total?.value).toBeCloseTo(3000, 9);
    expect(surfaceAreaM2).toBeCloseTo(2, 12);
    expect(unread).toBe(1);
    expect(runningTotal([newComponent(units, true)], 0).total).toBeNull();
  });
});
