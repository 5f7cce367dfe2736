import { describe, expect, it } from "vitest";
import { circularSegment } from "@/modules/systems/rules/circular-segment";
import { componentVolume } from "@/modules/systems/rules/component-volume";
import { component, filledTo, measured } from "../support/volume-components";

const tank = component({ shape: "lying-cylinder", diameterM: measured(2), lengthM: measured(5) });

describe("a lying cylinder with flat ends", () => {
  // Source: exact, by symmetry about the level diameter.
  it("holds half of its full volume when the water stands at half its height", () => {
    expect(componentVolume(filledTo(tank, 1)).volumeL).toBeCloseTo(componentVolume(tank).volumeL / 2, 9);
  });

  // Source: V = π r² l = π · 1² · 5 m³ (Euclid XII, Archimedes); exact.
  it("holds π·r²·l when full, however the fill is given", () => {
    expect(componentVolume(tank).volumeL).toBeCloseTo(5000 * Math.PI, 8);
    expect(componentVolume(filledTo(tank, 2)).volumeL).toBeCloseTo(5000 * Math.PI, 8);
    expect(componentVolume(filledTo(tank, 0)).volumeL).toBe(0);
  });

  // Source: elementary geometry: a segment of central angle θ is r²/2·(θ − sin θ); θ = 60° gives r²·(π/6 − √3/4).
  it("has the area of a 60° segment at the depth of its sagitta", () => {
    const sagittaM = 1 - Math.sqrt(3) / 2;
    expect(circularSegment(2, sagittaM).areaM2).toBeCloseTo(Math.PI / 6 - Math.sqrt(3) / 4, 12);
  });

  // Source: table of partly full level cylinders, depth/diameter against fraction of the full volume (Perry's Chemical
  // Engineers' Handbook, "Volume of partially filled horizontal cylinders"; figures from memory, and each confirmed by
  // integrating the chord 2·√(x(1−x)) with 200,000 mid-points outside the product).
  it.each([
    [0.05, 0.01869],
    [0.1, 0.05204],
    [0.15, 0.09406],
    [0.2, 0.14238],
    [0.25, 0.1955],
    [0.3, 0.25232],
    [0.35, 0.31192],
    [0.4, 0.37353],
    [0.45, 0.43644],
  ])("filled to %f of its diameter holds the tabulated fraction %f", (depthShare, fraction) => {
    const share = componentVolume(filledTo(tank, 2 * depthShare)).volumeL / componentVolume(tank).volumeL;
    expect(Math.abs(share - fraction)).toBeLessThanOrEqual(0.5e-5);
  });

  // Source: a pipe is a lying cylinder; 1 in = 25.4 mm exactly; V = π/4 · 0.0508² · 100 m³ = 202.683 L by hand.
  it("as 100 m of pipe of 50.8 mm bore holds 202.683 L", () => {
    const pipe = component({ shape: "pipe-run", innerDiameterM: measured(0.0508), lengthM: measured(100) });
    expect(componentVolume(pipe).volumeL).toBeCloseTo(202.683, 3);
  });
});

describe("a lying elliptic tank", () => {
  // Source: exact; an ellipse is a circle stretched by w/H, so every level section stretches by the same factor (Cavalieri).
  it("holds w/H times what a lying cylinder of its height holds at every depth", () => {
    const elliptic = component({
      shape: "lying-elliptic",
      widthM: measured(3),
      heightM: measured(2),
      lengthM: measured(5),
    });
    expect(componentVolume(elliptic).volumeL).toBeCloseTo((Math.PI / 4) * 3 * 2 * 5 * 1000, 8);
    for (const depthM of [0.2, 0.7, 1, 1.6, 2]) {
      const round = componentVolume(filledTo(tank, depthM)).volumeL;
      expect(componentVolume(filledTo(elliptic, depthM)).volumeL).toBeCloseTo(1.5 * round, 8);
    }
  });
});
