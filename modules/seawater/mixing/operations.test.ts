import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { alkalinityAdditionG, calciumAdditionG, magnesiumAdditionG } from "./additions";
import { dechlorination, dechlorinatorGPerG } from "./dechlorination";
import {
  exchangeContinuously,
  exchangeOnce,
  exchangeRepeatedly,
  exchangesNeeded,
  exchangeWithTurnover,
} from "./exchange";
import { heatingEnergyKWh, heatingTime } from "./heating";
import { purifierPerformance, timeToFillMin } from "./purifier";
import { tracerVolume } from "./tracer-volume";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const near = (one: number, other: number, size: number) =>
  expect(Math.abs(one - other)).toBeLessThanOrEqual(1e-9 * Math.max(1, size));
const clean = { startConcentration: 40, incomingConcentration: 0 };

describe("water changes", () => {
  it("again and again are the same as one after the other, with what the water makes and loses between", () => {
    fc.assert(
      fc.property(
        between(0, 100),
        between(0, 100),
        between(0.01, 0.9),
        fc.integer({ min: 1, max: 30 }),
        between(0, 5),
        between(0, 0.5),
        between(0, 14),
        (c0, cin, fraction, exchanges, production, loss, days) => {
          const got = exchangeRepeatedly({
            startConcentration: c0,
            incomingConcentration: cin,
            fraction,
            exchanges,
            productionPerDay: production,
            lossPerDay: loss,
            intervalDays: days,
          });
          let c = c0;
          let before = c0;
          for (let i = 0; i < exchanges; i++) {
            const balance = { startConcentration: c, incomingConcentration: 0, exchangedOverVolumePerDay: 0 };
            before = exchangeWithTurnover({
              ...balance,
              days,
              productionPerDay: production,
              lossPerDay: loss,
            }).concentration;
            c = exchangeOnce({ startConcentration: before, incomingConcentration: cin, fraction });
          }
          near(got.concentration, c, 200);
          near(got.beforeLastExchange, before, 200);
        },
      ),
    );
  });

  it("keep mass to 1e-9: what was there, what came and what was made is what left and what is there", () => {
    fc.assert(
      fc.property(
        between(0, 100),
        between(0, 100),
        between(0.01, 1),
        between(1, 1e6),
        (c0, cin, fraction, volumeL) => {
          const after = exchangeOnce({ startConcentration: c0, incomingConcentration: cin, fraction });
          near(
            c0 * volumeL + cin * fraction * volumeL - c0 * fraction * volumeL,
            after * volumeL,
            100 * volumeL,
          );
        },
      ),
    );
  });

  it("nitrate that keeps rising settles at production over removal, and stays there", () => {
    const weekly = { incomingConcentration: 0, fraction: 0.1, productionPerDay: 1, intervalDays: 7 };
    const { settlesAt } = exchangeRepeatedly({ ...weekly, startConcentration: 10, exchanges: 1 });
    // 7 mg/L made each week; a tenth of 70 is 7 (arithmetic): 63 just after the change, 70 just before.
    expect(settlesAt).toBeCloseTo(63, 9);
    const later = exchangeRepeatedly({ ...weekly, startConcentration: settlesAt, exchanges: 9 });
    expect(later.concentration).toBeCloseTo(63, 9);
    expect(later.beforeLastExchange).toBeCloseTo(70, 9);
  });

  it("in a steady stream follow the same balance as many small ones", () => {
    const many = exchangeRepeatedly({ ...clean, fraction: 1e-5, exchanges: 50000 }).concentration;
    expect(Math.abs(many - exchangeContinuously({ ...clean, exchangedOverVolume: 0.5 }))).toBeLessThan(1e-3);
  });

  it("with turnover agree with a step-by-step integration", () => {
    const flow = {
      startConcentration: 5,
      incomingConcentration: 2,
      exchangedOverVolumePerDay: 0.2,
      days: 10,
    };
    const turnover = { productionPerDay: 1.5, lossPerDay: 0.05 };
    let c = 5;
    const steps = 200000;
    const rate = (x: number) => 1.5 + 0.2 * (2 - x) - 0.05 * x;
    for (let i = 0; i < steps; i++) {
      const h = 10 / steps;
      c += h * rate(c + (h / 2) * rate(c));
    }
    const got = exchangeWithTurnover({ ...flow, ...turnover });
    expect(got.concentration).toBeCloseTo(c, 8);
    expect(got.settlesAt).toBeCloseTo(1.9 / 0.25, 12);
  });

  it("leave out where it settles when nothing takes away what is made", () => {
    const got = exchangeWithTurnover({
      ...clean,
      exchangedOverVolumePerDay: 0,
      days: 3,
      productionPerDay: 2,
    });
    expect(got).toEqual({ concentration: 46 });
  });

  it("number as many as reach the target, and one fewer does not", () => {
    fc.assert(
      fc.property(between(20, 100), between(0.05, 0.9), between(0.05, 0.95), (start, fraction, ratio) => {
        const target = start * ratio;
        const water = { startConcentration: start, incomingConcentration: 0, fraction };
        const { exchanges } = exchangesNeeded({ ...water, targetConcentration: target });
        expect(exchangeRepeatedly({ ...water, exchanges }).concentration).toBeLessThanOrEqual(
          target * (1 + 1e-6),
        );
        if (exchanges > 1) {
          expect(exchangeRepeatedly({ ...water, exchanges: exchanges - 1 }).concentration).toBeGreaterThan(
            target,
          );
        }
      }),
    );
    expect(exchangesNeeded({ ...clean, targetConcentration: 40, fraction: 0.1 }).exchanges).toBe(0);
    expect(exchangesNeeded({ ...clean, targetConcentration: 36, fraction: 0.1 }).exchanges).toBe(1);
  });

  it("refuse what cannot be", () => {
    expect(() => exchangeOnce({ ...clean, fraction: 0 })).toThrow(RangeError);
    expect(() => exchangeOnce({ ...clean, fraction: 1.1 })).toThrow(RangeError);
    expect(() => exchangeRepeatedly({ ...clean, fraction: 0.1, exchanges: 1.5 })).toThrow(RangeError);
    expect(() => exchangeRepeatedly({ ...clean, fraction: 0.1, exchanges: 1, lossPerDay: -1 })).toThrow(
      RangeError,
    );
    expect(() => exchangeContinuously({ ...clean, exchangedOverVolume: -1 })).toThrow(RangeError);
    expect(() => exchangesNeeded({ ...clean, targetConcentration: 0, fraction: 0.1 })).toThrow(
      /between the start and the new water/,
    );
    expect(() => exchangesNeeded({ ...clean, targetConcentration: 41, fraction: 0.1 })).toThrow(RangeError);
    expect(() =>
      exchangeOnce({ startConcentration: Number.NaN, incomingConcentration: 0, fraction: 0.1 }),
    ).toThrow(RangeError);
  });
});

describe("additions", () => {
  it("are in proportion to volume and rise, and inverse to purity", () => {
    fc.assert(
      fc.property(between(1, 1e6), between(0, 5), between(0.5, 1), (volumeL, rise, purityFraction) => {
        const pure = alkalinityAdditionG({ volumeL, riseMeqPerL: rise, additive: "Na2CO3" });
        near(
          alkalinityAdditionG({ volumeL, riseMeqPerL: rise, additive: "Na2CO3", purityFraction }) *
            purityFraction,
          pure,
          pure,
        );
        near(
          calciumAdditionG({ volumeL: 2 * volumeL, riseMgPerL: rise, additive: "CaCl2" }),
          2 * calciumAdditionG({ volumeL, riseMgPerL: rise, additive: "CaCl2" }),
          volumeL,
        );
      }),
    );
  });

  it("refuse a compound of another kind, a fall and an empty tank", () => {
    const wrong = "CaCl2" as unknown as "NaHCO3";
    expect(() => alkalinityAdditionG({ volumeL: 1, riseMeqPerL: 1, additive: wrong })).toThrow(
      "CaCl2 does not raise alkalinity.",
    );
    expect(() => magnesiumAdditionG({ volumeL: 1, riseMgPerL: -1, additive: "MgSO4" })).toThrow(RangeError);
    expect(() => calciumAdditionG({ volumeL: 0, riseMgPerL: 1, additive: "CaCl2" })).toThrow(RangeError);
    expect(() =>
      calciumAdditionG({ volumeL: 1, riseMgPerL: 1, additive: "CaCl2", purityFraction: 2 }),
    ).toThrow(RangeError);
  });
});

describe("heating", () => {
  const tank = { volumeL: 10000, salinityPsu: 35, fromTemperatureC: 15, toTemperatureC: 24 };

  it("takes longer with losses, and comes to the lossless time as they vanish", () => {
    const lossless = heatingTime({ ...tank, powerKW: 9 }).hours;
    const loss = (lossKWPerK: number) => ({ lossKWPerK, roomTemperatureC: 15 });
    expect(heatingTime({ ...tank, powerKW: 9, loss: loss(0.2) }).hours).toBeGreaterThan(lossless);
    expect(heatingTime({ ...tank, powerKW: 9, loss: loss(1e-9) }).hours).toBeCloseTo(lossless, 5);
    expect(heatingTime({ ...tank, powerKW: 9, loss: loss(0) }).hours).toBe(lossless);
  });

  it("with losses agrees with a step-by-step integration", () => {
    const got = heatingTime({
      ...tank,
      powerKW: 9,
      efficiencyFraction: 0.9,
      loss: { lossKWPerK: 0.3, roomTemperatureC: 18 },
    });
    const capacity = heatingEnergyKWh(tank) / 9;
    const steps = 100000;
    let t = 15;
    for (let i = 0; i < steps; i++) {
      const h = got.hours / steps;
      const rate = (x: number) => (8.1 - 0.3 * (x - 18)) / capacity;
      t += h * rate(t + (h / 2) * rate(t));
    }
    expect(t).toBeCloseTo(24, 6);
    expect(got.settlesAtC).toBeCloseTo(45, 9);
  });

  it("chills with negative power", () => {
    const down = { ...tank, fromTemperatureC: 24, toTemperatureC: 15 };
    expect(heatingTime({ ...down, powerKW: -9 }).hours).toBeCloseTo(
      heatingTime({ ...tank, powerKW: 9 }).hours,
      9,
    );
    const warmRoom = { lossKWPerK: 0.2, roomTemperatureC: 24 };
    expect(heatingTime({ ...down, powerKW: -9, loss: warmRoom }).hours).toBeGreaterThan(
      heatingTime({ ...down, powerKW: -9 }).hours,
    );
  });

  it("says where the water settles when it never comes there, and refuses no power or the wrong sign", () => {
    const loss = { lossKWPerK: 1, roomTemperatureC: 15 };
    expect(() => heatingTime({ ...tank, powerKW: 5, loss })).toThrow(
      "settles at 20.0 °C and never comes to 24 °C",
    );
    expect(() => heatingTime({ ...tank, powerKW: 0 })).toThrow(RangeError);
    expect(() => heatingTime({ ...tank, powerKW: -2 })).toThrow(/wrong sign/);
    expect(() => heatingTime({ ...tank, powerKW: 2, efficiencyFraction: 0 })).toThrow(RangeError);
    expect(() => heatingTime({ ...tank, powerKW: 2, loss: { ...loss, lossKWPerK: -1 } })).toThrow(RangeError);
    expect(() => heatingEnergyKWh({ ...tank, toTemperatureC: 90 })).toThrow(RangeError);
    expect(heatingTime({ ...tank, toTemperatureC: 15, powerKW: 1 }).hours).toBe(0);
  });
});

describe("a tracer test", () => {
  const test = {
    massG: 500,
    beforeMgPerL: 10,
    afterMgPerL: 60,
    massUncertaintyG: 0.5,
    beforeUncertaintyMgPerL: 0.8,
    afterUncertaintyMgPerL: 1,
  };

  it("keeps the tracer: volume times rise is the mass", () => {
    fc.assert(
      fc.property(between(1, 1e5), between(0, 100), between(0.1, 500), (massG, before, rise) => {
        const got = tracerVolume({ ...test, massG, beforeMgPerL: before, afterMgPerL: before + rise });
        near((got.volumeL * (before + rise - before)) / 1000, massG, massG);
      }),
    );
  });

  it("is surer when both readings share the meter's error, and less sure when they err against each other", () => {
    const alone = tracerVolume(test).standardUncertaintyL;
    expect(tracerVolume({ ...test, readingsCorrelation: 0.9 }).standardUncertaintyL).toBeLessThan(alone);
    expect(tracerVolume({ ...test, readingsCorrelation: -0.9 }).standardUncertaintyL).toBeGreaterThan(alone);
  });

  it("refuses a tracer that does not show, and impossible uncertainties", () => {
    expect(() => tracerVolume({ ...test, afterMgPerL: 10 })).toThrow("the tracer must show");
    expect(() => tracerVolume({ ...test, massG: 0 })).toThrow(RangeError);
    expect(() => tracerVolume({ ...test, massUncertaintyG: -1 })).toThrow(RangeError);
    expect(() => tracerVolume({ ...test, readingsCorrelation: 1.5 })).toThrow(RangeError);
  });
});

describe("the purifier", () => {
  it("keeps salt to 1e-9: what comes in leaves as permeate and concentrate", () => {
    fc.assert(
      fc.property(
        between(1, 5000),
        between(0, 1),
        between(1, 500),
        between(0.05, 0.95),
        (feed, pass, flow, recovery) => {
          const permeate = feed * pass;
          const permeateFlow = flow * recovery;
          const got = purifierPerformance({
            feed,
            permeate,
            feedFlowLPerMin: flow,
            permeateFlowLPerMin: permeateFlow,
          });
          near(
            permeate * permeateFlow + got.concentrate * got.concentrateFlowLPerMin,
            feed * flow,
            feed * flow,
          );
          expect(got.recoveryPercent).toBeCloseTo(100 * recovery, 9);
        },
      ),
    );
  });

  it("refuses feed and permeate the wrong way round", () => {
    const good = { feed: 450, permeate: 9, feedFlowLPerMin: 10, permeateFlowLPerMin: 7.5 };
    expect(() => purifierPerformance({ ...good, permeate: 451 })).toThrow("are the two exchanged?");
    expect(() => purifierPerformance({ ...good, permeateFlowLPerMin: 10 })).toThrow("are the two exchanged?");
    expect(() => purifierPerformance({ ...good, feed: 0 })).toThrow(RangeError);
    expect(() => timeToFillMin({ volumeL: 100, flowLPerMin: 0 })).toThrow(RangeError);
  });
});

describe("dechlorination", () => {
  it("of chloramine leaves its ammonia: one nitrogen for each Cl2 counted (14.007 / 70.9)", () => {
    const got = dechlorination({ volumeL: 1000, totalChlorineMgPerL: 2, chloramineFraction: 1 });
    expect(got.ammoniaReleasedMgNPerL).toBeCloseTo((2 * 14.007) / 70.9, 9);
    expect(dechlorination({ volumeL: 1000, totalChlorineMgPerL: 2 }).ammoniaReleasedMgNPerL).toBe(0);
  });

  it("takes agents by their label molar masses (thiosulfate pentahydrate 248.18, sulfite 126.04, metabisulfite 190.11)", () => {
    expect(dechlorinatorGPerG("thiosulfate-to-sulfur")).toBeCloseTo(248.18 / 70.9, 3);
    expect(dechlorinatorGPerG("thiosulfate-to-sulfate")).toBeCloseTo(248.18 / 4 / 70.9, 3);
    expect(dechlorinatorGPerG("sodium-sulfite")).toBeCloseTo(126.04 / 70.9, 3);
    expect(dechlorinatorGPerG("sodium-metabisulfite")).toBeCloseTo(190.11 / 2 / 70.9, 3);
    expect(dechlorinatorGPerG("sodium-bisulfite")).toBeCloseTo(104.06 / 70.9, 3);
    expect(dechlorinatorGPerG("sodium-ascorbate")).toBeCloseTo(198.11 / 70.9, 3);
  });

  it("adds excess and impurity, and refuses what cannot be", () => {
    const tank = { volumeL: 1000, totalChlorineMgPerL: 1, agent: "ascorbic-acid" as const };
    const need = dechlorination(tank).massG;
    expect(dechlorination({ ...tank, excessFraction: 0.1, purityFraction: 0.5 }).massG).toBeCloseTo(
      need * 2.2,
      9,
    );
    expect(() => dechlorination({ ...tank, totalChlorineMgPerL: -1 })).toThrow(RangeError);
    expect(() => dechlorination({ ...tank, chloramineFraction: 2 })).toThrow(RangeError);
    expect(() => dechlorination({ ...tank, excessFraction: -0.1 })).toThrow(RangeError);
    expect(() => dechlorination({ ...tank, purityFraction: 0 })).toThrow(RangeError);
  });
});
