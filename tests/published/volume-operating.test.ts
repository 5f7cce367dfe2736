import { describe, expect, it } from "vitest";
import { componentVolume } from "@/modules/systems/rules/component-volume";
import { joinedSystems, joinedVolume, operatingVolume } from "@/modules/systems/rules/operating-volume";
import { component, filledTo, measured } from "../support/volume-components";

describe("today's operating volume", () => {
  // Source: by hand: 4 m² × −0.25 m × 1000 = −1,000 L; u = √(30² + (4·1000·0.01)²) = 50 L (JCGM 100:2008, 5.1.2).
  it("is the volume of record less what the lowered level takes away", () => {
    const level = { levelOffsetM: measured(-0.25, 0.01), isDrained: false };
    const today = operatingVolume(measured(5000, 30), measured(4), level);
    expect(today.value).toBe(4000);
    expect(today.standardUncertainty).toBeCloseTo(50, 12);
  });

  // Source: exact for upright tanks: the same level change by geometry alone.
  it("equals the geometry at the new depth for a tank with plumb walls", () => {
    const tank = component({ shape: "upright-cylinder", diameterM: measured(3), heightM: measured(2) });
    const record = componentVolume(filledTo(tank, 1.5));
    const level = { levelOffsetM: measured(0.2), isDrained: false };
    const today = operatingVolume(measured(record.volumeL), measured(record.surfaceAreaM2), level);
    expect(today.value).toBeCloseTo(componentVolume(filledTo(tank, 1.7)).volumeL, 8);
  });

  it("is nothing when the system is drained, and the volume of record when the level is as determined", () => {
    const drained = { levelOffsetM: measured(0), isDrained: true };
    expect(operatingVolume(measured(5000, 30), null, drained)).toEqual(measured(0, 0));
    const same = { levelOffsetM: measured(0), isDrained: false };
    expect(operatingVolume(measured(5000, 30), null, same)).toEqual(measured(5000, 30));
  });

  it("is refused without a surface, and for a level below the floor", () => {
    const lower = { levelOffsetM: measured(-2), isDrained: false };
    expect(() => operatingVolume(measured(5000, 30), null, lower)).toThrow(/surface/);
    expect(() => operatingVolume(measured(5000, 30), measured(4), lower)).toThrow(/drained/);
  });

  // Source: sum and root of summed squares, 3-4-5 (JCGM 100:2008, 5.1.2).
  it("of joined systems is their sum, found over joins in either direction", () => {
    expect(joinedVolume([measured(1000, 3), measured(500, 4)])).toEqual(measured(1500, 5));
    expect(() => joinedVolume([])).toThrow(RangeError);
    const joins = [
      [1, 2],
      [3, 2],
      [4, 5],
    ] as const;
    expect(joinedSystems(1, joins)).toEqual([1, 2, 3]);
    expect(joinedSystems(6, joins)).toEqual([6]);
  });
});
