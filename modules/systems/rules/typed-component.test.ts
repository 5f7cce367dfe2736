import { describe, expect, it } from "vitest";
import { SHAPES, type TypedComponent } from "../model";
import { SHAPE_TABLE } from "../shapes.data";
import { ComponentRangeError, componentVolume } from "./component-volume";
import { readComponent, readDecimal, readQuantity } from "./typed-component";

const typed = (more: Partial<TypedComponent> = {}): TypedComponent => ({
  name: "tank",
  shape: "box",
  pointing: "down",
  lengthUnit: "cm",
  volumeUnit: "L",
  dimensions: {
    lengthM: { text: "250", uncertainty: "1" },
    widthM: { text: "120,0", uncertainty: "" },
    heightM: { text: "80", uncertainty: "0.5" },
  },
  fillDepth: null,
  displacement: null,
  isAtSurface: true,
  ...more,
});

describe("a number as typed", () => {
  it.each([
    ["2.5", 2.5],
    ["2,5", 2.5],
    [" 12 000 ", 12_000],
    ["-0.25", -0.25],
    ["−0,25", -0.25],
    [".5", 0.5],
  ])("“%s” reads as %d", (text, value) => expect(readDecimal(text)).toBe(value));

  it.each(["", "  ", "abc", "1e3", "1.2.3", "0x10", "Infinity", "1,234.5", "--1"])(
    "“%s” is no number",
    (text) => expect(readDecimal(text)).toBeNull(),
  );
});

describe("a component as typed", () => {
  it("is brought from centimetres to metres, uncertainty included", () => {
    const read = readComponent(typed());
    expect(read).toMatchObject({ shape: "box", lengthM: { value: 2.5, standardUncertainty: 0.01 } });
    expect(componentVolume(read).volumeL).toBeCloseTo(2400, 9);
  });

  // Source: the international foot is 0.3048 m and the US gallon 3.785411784 L exactly (NIST SP 811, appendix B).
  it("reads feet and US gallons by their exact definitions", () => {
    expect(readQuantity({ text: "10", uncertainty: "" }, "ft", "m", "lengthM").value).toBeCloseTo(3.048, 12);
    expect(readQuantity({ text: "100", uncertainty: "1" }, "US gal", "L", "volumeL")).toEqual({
      value: expect.closeTo(378.5411784, 9),
      standardUncertainty: expect.closeTo(3.785411784, 11),
    });
  });

  it.each(SHAPES)("gives every quantity that the formula of %s asks for", (shape) => {
    const { inputs } = SHAPE_TABLE[shape];
    const dimensions = Object.fromEntries(
      inputs.map(({ name }) => [name, { text: "1", uncertainty: "0.1" }]),
    );
    const volume = componentVolume(readComponent(typed({ shape, dimensions, lengthUnit: "m" })));
    expect(volume.volumeL).toBeGreaterThan(0);
    expect(volume.shares.map((share) => share.input).sort()).toEqual(inputs.map(({ name }) => name).sort());
  });

  it("says which input is missing or no number", () => {
    const field = (more: Partial<TypedComponent>) => {
      try {
        readComponent(typed(more));
      } catch (error) {
        return error instanceof ComponentRangeError ? error.field : error;
      }
      return "nothing was thrown";
    };
    expect(field({ dimensions: {} })).toBe("lengthM");
    expect(field({ fillDepth: { text: "half", uncertainty: "" } })).toBe("fillDepthM");
    expect(field({ displacement: { text: "10", uncertainty: "-1" } })).toBe("displacementL");
  });
});
