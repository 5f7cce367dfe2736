import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { component, filledTo, measured } from "@/tests/support/volume-components";
import type { Measured, ShapeDimensions, VolumeComponent } from "../model";
import { ComponentRangeError, componentVolume, innerHeightM } from "./component-volume";

const metres = fc.double({ min: 0.05, max: 30, noNaN: true }).map((value) => measured(value));

/** Every shape that has a water level, with plausible dimensions. */
const shapes: fc.Arbitrary<ShapeDimensions> = fc.oneof(
  fc.record({ shape: fc.constant("box" as const), lengthM: metres, widthM: metres, heightM: metres }),
  fc.record({ shape: fc.constant("upright-cylinder" as const), diameterM: metres, heightM: metres }),
  fc.record({ shape: fc.constant("lying-cylinder" as const), diameterM: metres, lengthM: metres }),
  fc.record({
    shape: fc.constant("cone" as const),
    tip: fc.constantFrom("up" as const, "down" as const),
    diameterM: metres,
    heightM: metres,
  }),
  fc.record({
    shape: fc.constant("frustum" as const),
    bottomDiameterM: metres,
    topDiameterM: metres,
    heightM: metres,
  }),
  fc.record({
    shape: fc.constant("spherical-cap" as const),
    crown: fc.constantFrom("up" as const, "down" as const),
    rimDiameterM: metres,
    heightM: metres,
  }),
  fc.record({
    shape: fc.constant("upright-elliptic" as const),
    longDiameterM: metres,
    shortDiameterM: metres,
    heightM: metres,
  }),
  fc.record({
    shape: fc.constant("lying-elliptic" as const),
    widthM: metres,
    heightM: metres,
    lengthM: metres,
  }),
  fc.record({ shape: fc.constant("pipe-run" as const), innerDiameterM: metres, lengthM: metres }),
);
const share = fc.double({ min: 0.01, max: 0.99, noNaN: true });
const heightOf = (whole: VolumeComponent) => innerHeightM(whole) ?? 0;
const litres = (whole: VolumeComponent) => componentVolume(whole).volumeL;

/** Area of the level section at height x, written here from plane geometry, independently of the product. */
function sectionM2(shape: ShapeDimensions, x: number): number {
  const disc = (diameterM: number) => (Math.PI * diameterM ** 2) / 4;
  const chord = (diameterM: number) =>
    2 * Math.sqrt(Math.max(0, (diameterM / 2) ** 2 - (x - diameterM / 2) ** 2));
  switch (shape.shape) {
    case "box":
      return shape.lengthM.value * shape.widthM.value;
    case "upright-cylinder":
      return disc(shape.diameterM.value);
    case "lying-cylinder":
      return chord(shape.diameterM.value) * shape.lengthM.value;
    case "pipe-run":
      return chord(shape.innerDiameterM.value) * shape.lengthM.value;
    case "cone": {
      const up = x / shape.heightM.value;
      return disc(shape.diameterM.value * (shape.tip === "down" ? up : 1 - up));
    }
    case "frustum": {
      const up = x / shape.heightM.value;
      return disc(shape.bottomDiameterM.value * (1 - up) + shape.topDiameterM.value * up);
    }
    case "spherical-cap": {
      const radiusM =
        ((shape.rimDiameterM.value / 2) ** 2 + shape.heightM.value ** 2) / (2 * shape.heightM.value);
      const fromCrown = shape.crown === "down" ? x : shape.heightM.value - x;
      return Math.PI * (radiusM ** 2 - (radiusM - fromCrown) ** 2);
    }
    case "upright-elliptic":
      return (Math.PI / 4) * shape.longDiameterM.value * shape.shortDiameterM.value;
    case "lying-elliptic":
      return chord(shape.heightM.value) * (shape.widthM.value / shape.heightM.value) * shape.lengthM.value;
    case "free-litres":
      return 0;
  }
}

/** Mid-point sum over 4,000 slices, with slices crowded towards the bottom where round tanks begin. */
function integrateL(shape: ShapeDimensions, depthM: number): number {
  const slices = 4000;
  let sumM3 = 0;
  for (let index = 0; index < slices; index++) {
    const t = (index + 0.5) / slices;
    sumM3 += sectionM2(shape, depthM * t * t) * depthM * 2 * t * (1 / slices);
  }
  return sumM3 * 1000;
}

const numericFields = (whole: VolumeComponent): string[] =>
  Object.entries(whole)
    .filter(([, value]) => typeof value === "object" && value !== null)
    .map(([field]) => field);
const withField = (whole: VolumeComponent, field: string, value: Measured): VolumeComponent =>
  ({ ...whole, [field]: value }) as VolumeComponent;

describe("the volume of a component", () => {
  it("rises with the depth of water", () => {
    fc.assert(
      fc.property(shapes, share, share, (shape, one, other) => {
        fc.pre(Math.abs(one - other) > 1e-3);
        const whole = component(shape);
        const at = (part: number) => litres(filledTo(whole, heightOf(whole) * part));
        expect(at(Math.max(one, other))).toBeGreaterThan(at(Math.min(one, other)));
      }),
    );
  });

  it("is nothing when empty and the whole when filled to the top", () => {
    fc.assert(
      fc.property(shapes, (shape) => {
        const whole = component(shape);
        expect(litres(filledTo(whole, 0)) / litres(whole)).toBeCloseTo(0, 12);
        expect(litres(filledTo(whole, heightOf(whole))) / litres(whole)).toBeCloseTo(1, 9);
      }),
    );
  });

  it("below a level and above it make up the whole, turned upside down", () => {
    fc.assert(
      fc.property(shapes, share, (shape, part) => {
        const whole = component(shape);
        const heightM = heightOf(whole);
        const turned = component(upsideDown(shape));
        const together =
          litres(filledTo(whole, heightM * part)) + litres(filledTo(turned, heightM - heightM * part));
        expect(together / litres(whole)).toBeCloseTo(1, 9);
      }),
    );
  });

  it("agrees with a numeric integral of its level sections", () => {
    fc.assert(
      fc.property(shapes, share, (shape, part) => {
        const whole = component(shape);
        const depthM = heightOf(whole) * part;
        expect(litres(filledTo(whole, depthM)) / integrateL(shape, depthM)).toBeCloseTo(1, 4);
      }),
    );
  });

  it("has partial derivatives that agree with central differences, part-full and full", () => {
    fc.assert(
      fc.property(shapes, fc.option(fc.double({ min: 0.1, max: 0.9, noNaN: true })), (shape, part) => {
        const plain = component(shape);
        const whole = part === null ? plain : filledTo(plain, heightOf(plain) * part);
        for (const field of numericFields(whole)) {
          const at = (whole as unknown as Record<string, Measured>)[field]?.value ?? 0;
          const step = at * 1e-6;
          const difference =
            (litres(withField(whole, field, measured(at + step))) -
              litres(withField(whole, field, measured(at - step)))) /
            (2 * step);
          const told = componentVolume(withField(whole, field, measured(at, 1))).standardUncertaintyL;
          const size = Math.max(Math.abs(difference), litres(whole) / at) + 1e-9;
          expect(Math.abs(told - Math.abs(difference)) / size).toBeLessThan(1e-5);
        }
      }),
    );
  });

  it("has the surface that a millimetre of water covers", () => {
    fc.assert(
      fc.property(shapes, fc.double({ min: 0.1, max: 0.9, noNaN: true }), (shape, part) => {
        const whole = component(shape);
        const depthM = heightOf(whole) * part;
        const { surfaceAreaM2 } = componentVolume(filledTo(whole, depthM));
        expect(surfaceAreaM2 / sectionM2(shape, depthM)).toBeCloseTo(1, 9);
      }),
    );
  });
});

/** The same solid standing on its head. */
function upsideDown(shape: ShapeDimensions): ShapeDimensions {
  switch (shape.shape) {
    case "cone":
      return { ...shape, tip: shape.tip === "up" ? "down" : "up" };
    case "spherical-cap":
      return { ...shape, crown: shape.crown === "up" ? "down" : "up" };
    case "frustum":
      return { ...shape, bottomDiameterM: shape.topDiameterM, topDiameterM: shape.bottomDiameterM };
    default:
      return shape;
  }
}

describe("a component that cannot be", () => {
  const box = component({ shape: "box", lengthM: measured(1), widthM: measured(1), heightM: measured(1) });
  const cases: [string, VolumeComponent, string][] = [
    ["with no length", withField(box, "lengthM", measured(0)), "lengthM"],
    ["with a length that is not a number", withField(box, "lengthM", measured(Number.NaN)), "lengthM"],
    ["with a negative uncertainty", withField(box, "widthM", measured(1, -0.1)), "widthM"],
    ["with water above its rim", filledTo(box, 1.01), "fillDepthM"],
    ["with a negative depth", filledTo(box, -0.1), "fillDepthM"],
    ["with more rock than room", { ...box, displacementL: measured(1001) }, "displacementL"],
    [
      "of free litres with a depth",
      filledTo(component({ shape: "free-litres", volumeL: measured(10) }), 1),
      "fillDepthM",
    ],
    [
      "as a frustum with two points for ends",
      component({
        shape: "frustum",
        bottomDiameterM: measured(0),
        topDiameterM: measured(0),
        heightM: measured(1),
      }),
      "bottomDiameterM",
    ],
  ];
  it.each(cases)("is refused %s, naming the field", (_title, whole, field) => {
    let thrown: unknown;
    try {
      componentVolume(whole);
    } catch (error) {
      thrown = error;
    }
    expect(thrown).toBeInstanceOf(ComponentRangeError);
    expect((thrown as ComponentRangeError).field).toBe(field);
  });
});
