import { describe, expect, it } from "vitest";
import { componentVolume } from "@/modules/systems/rules/component-volume";
import { component, filledTo, measured } from "../support/volume-components";

const litres = (whole: Parameters<typeof componentVolume>[0]) => componentVolume(whole).volumeL;

describe("upright tanks", () => {
  // Source: arithmetic; 2.5 · 1.2 · 0.8 m³ = 2.4 m³.
  it("a box of 2.5 × 1.2 × 0.8 m holds 2,400 L, and 1,500 L at 0.5 m", () => {
    const box = component({
      shape: "box",
      lengthM: measured(2.5),
      widthM: measured(1.2),
      heightM: measured(0.8),
    });
    expect(litres(box)).toBeCloseTo(2400, 9);
    expect(litres(filledTo(box, 0.5))).toBeCloseTo(1500, 9);
  });

  // Source: exact; π/4 · d² · h.
  it("a cylinder of 4 m diameter and 3 m height holds 12π m³", () => {
    const round = component({ shape: "upright-cylinder", diameterM: measured(4), heightM: measured(3) });
    expect(litres(round)).toBeCloseTo(12_000 * Math.PI, 7);
    expect(componentVolume(round).surfaceAreaM2).toBeCloseTo(4 * Math.PI, 12);
  });

  // Source: exact; the area of an ellipse is π times its half-axes (Archimedes, On Conoids and Spheroids, 4).
  it("an elliptic tank of 4 × 2 m and 1.5 m height holds 3π m³", () => {
    const shape = {
      shape: "upright-elliptic",
      longDiameterM: measured(4),
      shortDiameterM: measured(2),
    } as const;
    expect(litres(component({ ...shape, heightM: measured(1.5) }))).toBeCloseTo(3000 * Math.PI, 8);
  });
});

describe("cones and frustums", () => {
  // Source: Euclid XII.10: a cone is a third of the cylinder on its base.
  it("a cone holds a third of its cylinder, tip up or down", () => {
    for (const tip of ["up", "down"] as const) {
      const cone = component({ shape: "cone", tip, diameterM: measured(2), heightM: measured(3) });
      expect(litres(cone)).toBeCloseTo(1000 * Math.PI, 8);
    }
  });

  // Source: similar solids are as the cubes of their heights (Euclid XII.12): half the height, an eighth of the volume.
  it("a cone filled to half its height holds 1/8 with the tip down and 7/8 with the tip up", () => {
    const down = component({ shape: "cone", tip: "down", diameterM: measured(2), heightM: measured(3) });
    const up = component({ shape: "cone", tip: "up", diameterM: measured(2), heightM: measured(3) });
    expect(litres(filledTo(down, 1.5)) / litres(down)).toBeCloseTo(1 / 8, 12);
    expect(litres(filledTo(up, 1.5)) / litres(up)).toBeCloseTo(7 / 8, 12);
  });

  // Source: a frustum is a cone less the cone cut off: diameters 4 and 2 m over 3 m are a cone of 6 m (8π m³) less one of 3 m (π m³).
  it("a frustum of 4 and 2 m over 3 m holds 7π m³, whichever end is below", () => {
    const ends = (bottom: number, top: number) =>
      component({
        shape: "frustum",
        bottomDiameterM: measured(bottom),
        topDiameterM: measured(top),
        heightM: measured(3),
      });
    expect(litres(ends(4, 2))).toBeCloseTo(7000 * Math.PI, 8);
    expect(litres(ends(2, 4))).toBeCloseTo(7000 * Math.PI, 8);
    expect(litres(ends(3, 3))).toBeCloseTo(6750 * Math.PI, 8);
  });
});

describe("spherical caps", () => {
  // Source: Archimedes, On the Sphere and Cylinder I.34: a sphere is 2/3 of its cylinder; a half sphere is 2/3·π·r³.
  it("a cap as high as half its rim is a half sphere", () => {
    const bowl = component({
      shape: "spherical-cap",
      crown: "down",
      rimDiameterM: measured(2),
      heightM: measured(1),
    });
    expect(litres(bowl)).toBeCloseTo((2000 / 3) * Math.PI, 8);
  });

  // Source: exact integral ∫₀² π(2·5·x − x²)dx = 52π/3 for a sphere of 5 m radius; the rim at 2 m is 2·√(5² − 3²) = 8 m wide.
  it("a cap of 8 m rim and 2 m height holds 52π/3 m³, crown up or down", () => {
    for (const crown of ["up", "down"] as const) {
      const cap = component({
        shape: "spherical-cap",
        crown,
        rimDiameterM: measured(8),
        heightM: measured(2),
      });
      expect(litres(cap)).toBeCloseTo((52_000 / 3) * Math.PI, 7);
    }
  });

  // Source: the same integral to 1 m: π(5 − 1/3) = 14π/3 m³ in the dish; a dome holds the rest of the 52π/3 m³ below.
  it("filled to 1 m, that cap holds 14π/3 m³ crown down and 38π/3 m³ crown up", () => {
    const cap = (crown: "up" | "down") =>
      component({ shape: "spherical-cap", crown, rimDiameterM: measured(8), heightM: measured(2) });
    expect(litres(filledTo(cap("down"), 1))).toBeCloseTo((14_000 / 3) * Math.PI, 7);
    expect(litres(filledTo(cap("up"), 1))).toBeCloseTo((38_000 / 3) * Math.PI, 7);
  });
});
