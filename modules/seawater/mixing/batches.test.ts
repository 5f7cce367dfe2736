import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { densityKgPerM3 } from "../water/density";
import { saltContentGPerKg } from "../water/salt-content";
import { blend } from "./blend";
import { evaporation, saltToRaise, waterToDilute } from "./dilution";
import { saltCharge, saltForWater } from "./salt-charge";
import { bulkDensityForMeasuredMixGPerMl, salinityFromMeasuredMix } from "./volume-measure";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const kg = (volumeL: number, salinityPsu: number, temperatureC: number) =>
  (volumeL * densityKgPerM3({ salinityPsu, temperatureC })) / 1000;
const share = (salinityPsu: number, basis: "reference" | "nominal") =>
  saltContentGPerKg({ salinityPsu, basis }) / 1000;
const mix = fc.record({
  moistureFraction: between(0, 0.3),
  purityFraction: between(0.8, 1),
  basis: fc.constantFrom("reference" as const, "nominal" as const),
});
/** Dissolved salt and inert matter in a kilogram of mix, reckoned here from the bag's own words. */
const saltOf = (m: { moistureFraction: number; purityFraction: number }) =>
  (1 - m.moistureFraction) * m.purityFraction;
const inertOf = (m: { moistureFraction: number; purityFraction: number }) =>
  (1 - m.moistureFraction) * (1 - m.purityFraction);
const near = (one: number, other: number, size: number) =>
  expect(Math.abs(one - other)).toBeLessThanOrEqual(1e-9 * Math.max(1, size));

describe("a salt charge", () => {
  it("keeps water and salt to 1e-9, with moisture, purity and a heel", () => {
    fc.assert(
      fc.property(
        between(100, 200000),
        between(20, 38),
        between(5, 30),
        mix,
        between(0, 0.4),
        between(0, 20),
        (volumeL, s, t, m, heelShare, heelS) => {
          const heel = { volumeL: volumeL * heelShare, salinityPsu: heelS, temperatureC: t };
          const got = saltCharge({ volumeL, salinityPsu: s, temperatureC: t, heel, ...m });
          const heelKg = kg(heel.volumeL, heelS, t);
          const finished = kg(volumeL, s, t);
          near(heelKg + got.waterKg + got.mixKg, finished + got.mixKg * inertOf(m), finished);
          near(
            heelKg * share(heelS, m.basis) + got.mixKg * saltOf(m),
            finished * share(s, m.basis),
            finished,
          );
          near(
            got.waterL * densityKgPerM3({ salinityPsu: 0, temperatureC: t }),
            1000 * got.waterKg,
            finished * 1000,
          );
        },
      ),
    );
  });

  it("into water and for a volume are each other's inverse", () => {
    fc.assert(
      fc.property(between(100, 20000), between(5, 40), between(5, 35), mix, (waterL, s, t, m) => {
        const made = saltForWater({ waterL, salinityPsu: s, temperatureC: t, ...m });
        const again = saltCharge({ volumeL: made.finishedL, salinityPsu: s, temperatureC: t, ...m });
        near(again.mixKg, made.mixKg, made.finishedKg);
        near(again.waterL, waterL, waterL);
      }),
    );
  });

  it("needs nothing when the heel is the finished water already", () => {
    const water = { volumeL: 1000, salinityPsu: 33, temperatureC: 20 };
    const got = saltCharge({ ...water, heel: water });
    expect(got.mixKg).toBeCloseTo(0, 9);
    expect(got.waterKg).toBeCloseTo(0, 9);
  });

  it("refuses a heel that is too salt or too large, and a mix that is no mix", () => {
    const batch = { volumeL: 1000, salinityPsu: 30, temperatureC: 20 };
    const heel = (volumeL: number, salinityPsu: number) => ({ volumeL, salinityPsu, temperatureC: 20 });
    expect(() => saltCharge({ ...batch, heel: heel(950, 36) })).toThrow(/more salt than the finished water/);
    expect(() => saltCharge({ ...batch, heel: heel(1100, 10) })).toThrow(/more than the volume/);
    expect(() => saltCharge({ ...batch, moistureFraction: 1 })).toThrow(RangeError);
    expect(() => saltCharge({ ...batch, moistureFraction: -0.1 })).toThrow(RangeError);
    expect(() => saltCharge({ ...batch, purityFraction: 0 })).toThrow(RangeError);
    expect(() => saltCharge({ ...batch, volumeL: 0 })).toThrow(RangeError);
    expect(() => saltCharge({ ...batch, salinityPsu: 60 })).toThrow(RangeError);
    expect(() =>
      saltForWater({ waterL: 10, salinityPsu: 40, temperatureC: 20, moistureFraction: 0.97 }),
    ).toThrow(RangeError);
  });
});

describe("changing salinity", () => {
  it("by water keeps the salt to 1e-9", () => {
    fc.assert(
      fc.property(
        between(10, 1e6),
        between(1, 40),
        between(0.1, 1),
        between(0, 40),
        (volumeL, s1, down, t) => {
          const s2 = s1 * down;
          const got = waterToDilute({ volumeL, fromSalinityPsu: s1, toSalinityPsu: s2, temperatureC: t });
          const start = kg(volumeL, s1, t);
          near(start * s1, (start + got.waterKg) * s2, start * s1);
          near(kg(got.finishedL, s2, t), start + got.waterKg, start);
        },
      ),
    );
  });

  it("by salt keeps the salt to 1e-9", () => {
    fc.assert(
      fc.property(
        between(10, 1e6),
        between(1, 30),
        between(0, 10),
        between(0, 40),
        mix,
        (volumeL, s1, up, t, m) => {
          const s2 = s1 + up;
          const got = saltToRaise({ volumeL, fromSalinityPsu: s1, toSalinityPsu: s2, temperatureC: t, ...m });
          const start = kg(volumeL, s1, t);
          near(
            start * share(s1, m.basis) + got.mixKg * saltOf(m),
            got.finishedKg * share(s2, m.basis),
            start,
          );
          near(start + got.mixKg, got.finishedKg + got.inertKg, start);
        },
      ),
    );
  });

  it("by evaporation is undone by the same mass of pure water", () => {
    fc.assert(
      fc.property(between(10, 1e5), between(5, 38), between(0.1, 3), between(1, 38), (volumeL, s1, up, t) => {
        const s2 = s1 + up;
        const lost = evaporation({ volumeL, fromSalinityPsu: s1, toSalinityPsu: s2, temperatureC: t });
        const left = kg(volumeL, s1, t) - lost.lostKg;
        const leftL = (1000 * left) / densityKgPerM3({ salinityPsu: s2, temperatureC: t });
        const back = waterToDilute({
          volumeL: leftL,
          fromSalinityPsu: s2,
          toSalinityPsu: s1,
          temperatureC: t,
        });
        near(back.waterKg, lost.lostKg, left);
        near(back.finishedL, volumeL, volumeL);
      }),
    );
  });

  it("refuses the wrong direction", () => {
    const up = { volumeL: 100, fromSalinityPsu: 30, toSalinityPsu: 33, temperatureC: 20 };
    const down = { ...up, fromSalinityPsu: 33, toSalinityPsu: 30 };
    expect(() => waterToDilute(up)).toThrow(/water alone does not raise salinity/);
    expect(() => saltToRaise(down)).toThrow(/salt does not lower salinity/);
    expect(() => evaporation(down)).toThrow(/evaporation raises salinity/);
    expect(() => waterToDilute({ ...down, toSalinityPsu: 0 })).toThrow(RangeError);
    expect(() => evaporation({ ...up, toSalinityPsu: 50 })).toThrow(RangeError);
  });
});

describe("blends", () => {
  const stream = fc.record({
    volumeL: between(1, 10000),
    salinityPsu: between(0, 40),
    temperatureC: between(0, 40),
  });

  it("keep mass and salt to 1e-9 and lie between what was mixed", () => {
    fc.assert(
      fc.property(fc.array(stream, { minLength: 1, maxLength: 5 }), (streams) => {
        const got = blend({ streams });
        const mass = streams.reduce((sum, s) => sum + kg(s.volumeL, s.salinityPsu, s.temperatureC), 0);
        const salt = streams.reduce(
          (sum, s) => sum + kg(s.volumeL, s.salinityPsu, s.temperatureC) * s.salinityPsu,
          0,
        );
        near(got.massKg, mass, mass);
        near(got.massKg * got.salinityPsu, salt, salt);
        near(kg(got.volumeL, got.salinityPsu, got.temperatureC), mass, mass);
        const temperatures = streams.map(({ temperatureC }) => temperatureC);
        expect(got.temperatureC).toBeGreaterThanOrEqual(Math.min(...temperatures) - 1e-9);
        expect(got.temperatureC).toBeLessThanOrEqual(Math.max(...temperatures) + 1e-9);
      }),
    );
  });

  it("refuse nothing and negative volumes", () => {
    expect(() => blend({ streams: [] })).toThrow(RangeError);
    expect(() => blend({ streams: [{ volumeL: -1, salinityPsu: 0, temperatureC: 20 }] })).toThrow(RangeError);
  });
});

describe("mix by the cup", () => {
  it("gives the bulk density back", () => {
    fc.assert(
      fc.property(between(5, 40), between(10, 500), between(1, 20), mix, (salinityPsu, mixMl, waterL, m) => {
        const cup = { mixMl, waterL, temperatureC: 25, ...m };
        const bulkDensityGPerMl = bulkDensityForMeasuredMixGPerMl({ ...cup, salinityPsu });
        near(salinityFromMeasuredMix({ ...cup, bulkDensityGPerMl }), salinityPsu, salinityPsu);
      }),
    );
  });

  it("refuses a cup of nothing and a brine beyond 42", () => {
    const cup = { mixMl: 100, bulkDensityGPerMl: 1.1, waterL: 4, temperatureC: 25 };
    expect(() => salinityFromMeasuredMix({ ...cup, mixMl: 0 })).toThrow(RangeError);
    expect(() => salinityFromMeasuredMix({ ...cup, waterL: 1 })).toThrow(RangeError);
    expect(() => bulkDensityForMeasuredMixGPerMl({ ...cup, salinityPsu: 35, mixMl: 0 })).toThrow(RangeError);
  });
});
