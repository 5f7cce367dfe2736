import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { calibrationLine, lineThroughOrigin, weightedCalibrationLine } from "./calibration";
import { currieCountLimits, currieLimits } from "./currie";
import { recoveryPercent, relativePercentDifference } from "./duplicates";
import { inversePrediction } from "./inverse-prediction";
import { lineDetectionLimits } from "./line-detection-limit";
import {
  detectionLimitFromBlanks,
  detectionLimitMayStay,
  methodDetectionLimit,
} from "./method-detection-limit";
import { linearityTest, quadraticCalibration } from "./quadratic-calibration";
import { standardAddition } from "./standard-addition";

const coefficient = fc.double({ min: -20, max: 20, noNaN: true });
const noisy = { x: [0, 1, 2, 3, 4, 5], y: [0.1, 1.05, 1.9, 3.1, 3.95, 5.02] };

describe("calibration", () => {
  it("points on a line give the line, points on a parabola the parabola", () => {
    fc.assert(
      fc.property(coefficient, coefficient, coefficient, (a, b, c) => {
        const x = [-3, -1, 0, 2, 5, 11];
        const line = calibrationLine({ x, y: x.map((value) => a + b * value) });
        expect(line.slope).toBeCloseTo(b, 9);
        expect(line.intercept).toBeCloseTo(a, 9);
        const curve = quadraticCalibration({ x, y: x.map((value) => a + b * value + c * value * value) });
        expect(curve.c0).toBeCloseTo(a, 8);
        expect(curve.c1).toBeCloseTo(b, 8);
        expect(curve.c2).toBeCloseTo(c, 8);
      }),
    );
  });

  it("a content read back from its own signal is the content", () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 5, noNaN: true }), (content) => {
        const line = calibrationLine(noisy);
        const { x } = inversePrediction({ line, signal: line.intercept + line.slope * content });
        expect(x).toBeCloseTo(content, 10);
      }),
    );
  });

  it("equal weights give the ordinary line, and more replicates a narrower interval", () => {
    const line = calibrationLine(noisy);
    const weighted = weightedCalibrationLine({ ...noisy, sd: [2, 2, 2, 2, 2, 2] });
    expect(weighted.slope).toBeCloseTo(line.slope, 12);
    expect(weighted.residualSd).toBeCloseTo(line.residualSd, 12);
    const once = inversePrediction({ line, signal: 3 });
    expect(inversePrediction({ line, signal: 3, replicates: 4 }).halfWidth).toBeLessThan(once.halfWidth);
  });

  it("the middle of the line is read most surely", () => {
    const line = calibrationLine(noisy);
    const atMean = inversePrediction({ line, signal: line.yMean }).se;
    expect(inversePrediction({ line, signal: line.yMean + 2 }).se).toBeGreaterThan(atMean);
  });

  it("points on a clear curve are found not to be linear", () => {
    const x = [0, 1, 2, 3, 4, 5, 6];
    const y = x.map((value, i) => value * value + (i % 2 === 0 ? 0.05 : -0.05));
    expect(linearityTest({ x, y }).linear).toBe(false);
    expect(linearityTest(noisy).linear).toBe(true);
  });

  it("too few points, equal contents, unequal lengths and a flat line are refused", () => {
    expect(() => calibrationLine({ x: [1, 2], y: [1, 2] })).toThrow(/at least 3/);
    expect(() => calibrationLine({ x: [1, 1, 1], y: [1, 2, 3] })).toThrow(/equal/);
    expect(() => calibrationLine({ x: [1, 2, 3], y: [1, 2] })).toThrow(/same length/);
    expect(() => lineThroughOrigin({ x: [0, 0], y: [1, 2] })).toThrow(/zero/);
    expect(() => quadraticCalibration({ x: [1, 1, 2, 2], y: [1, 2, 3, 4] })).toThrow(/three different x/);
    expect(() => weightedCalibrationLine({ ...noisy, sd: [1, 1, 0, 1, 1, 1] })).toThrow(/sd/);
    const flat = calibrationLine({ x: [0, 1, 2], y: [1, 2, 1] });
    expect(() => inversePrediction({ line: flat, signal: 1 })).toThrow(/slope/);
    expect(() => linearityTest({ x: [0, 1, 2, 3], y: [1, 2, 3, 4] })).toThrow(/every point/);
  });
});

describe("detection limits", () => {
  it("critical value, detection and quantification limit stand in that order", () => {
    const limits = lineDetectionLimits({ line: calibrationLine(noisy) });
    expect(limits.detection).toBeCloseTo(2 * limits.critical, 12);
    expect(limits.quantification).toBeGreaterThan(limits.detection);
    const counts = currieCountLimits({ blankCounts: 50, blank: "paired" });
    expect(counts.detection).toBeGreaterThan(counts.critical);
    expect(counts.quantification).toBeGreaterThan(counts.detection);
  });

  it("a line too uncertain gives no quantification limit, a falling one none at all", () => {
    const wild = calibrationLine({ x: [0, 1, 2], y: [0, 5, 1] });
    expect(() => lineDetectionLimits({ line: wild })).toThrow(/too uncertain/);
    expect(() => lineDetectionLimits({ line: calibrationLine({ x: [0, 1, 2], y: [3, 2, 0] }) })).toThrow(
      /rise/,
    );
  });

  it("an estimated standard deviation costs more than a known one, and less as freedom grows", () => {
    const known = currieLimits({ sd: 1 });
    const few = currieLimits({ sd: 1, df: 4 });
    const many = currieLimits({ sd: 1, df: 2000 });
    expect(few.detection).toBeGreaterThan(known.detection);
    expect(many.detection).toBeCloseTo(known.detection, 2);
    expect(() => currieCountLimits({ blankCounts: -1, blank: "paired" })).toThrow(RangeError);
  });

  it("fewer than seven spikes or blanks are refused", () => {
    const seven = [1, 2, 1, 2, 1, 2, 1];
    expect(() => methodDetectionLimit({ spikes: seven.slice(1), blanks: seven })).toThrow(/at least 7/);
    expect(() => methodDetectionLimit({ spikes: seven, blanks: seven.slice(1) })).toThrow(/7 method blanks/);
  });

  it("with 100 blanks or more the rank replaces the highest blank, also when most are not detected", () => {
    const blanks = Array.from({ length: 200 }, (_, i) => (i < 150 ? null : i));
    expect(detectionLimitFromBlanks(blanks)).toEqual({
      fromBlanks: 197,
      blankRule: "99th percentile of blanks",
    });
    expect(detectionLimitFromBlanks(blanks.slice(0, 99).map((_, i) => (i === 0 ? 3 : null))).blankRule).toBe(
      "highest blank",
    );
  });

  it("a standing limit falls when the new one leaves 0.5 to 2.0 times or 3 % of blanks exceed it", () => {
    const given = { standing: 1, fresh: 1, shareOfBlanksAbove: 0 };
    expect(detectionLimitMayStay(given)).toBe(true);
    expect(detectionLimitMayStay({ ...given, fresh: 2.01 })).toBe(false);
    expect(detectionLimitMayStay({ ...given, fresh: 0.49 })).toBe(false);
    expect(detectionLimitMayStay({ ...given, shareOfBlanksAbove: 0.03 })).toBe(false);
  });
});

describe("duplicates, recovery, standard addition", () => {
  it("a relative difference does not depend on order or unit and stays below 200 %", () => {
    const content = fc.double({ min: 0.001, max: 1000, noNaN: true });
    fc.assert(
      fc.property(content, content, (a, b) => {
        const ours = relativePercentDifference(a, b);
        expect(relativePercentDifference(b, a)).toBe(ours);
        expect(relativePercentDifference(7 * a, 7 * b)).toBeCloseTo(ours, 9);
        expect(ours).toBeLessThan(200);
      }),
    );
  });

  it("an addition of nothing and a negative mean are refused", () => {
    expect(() => recoveryPercent({ spiked: 2, unspiked: 1, added: 0 })).toThrow(/added/);
    expect(() => relativePercentDifference(-1, -3)).toThrow(/not above zero/);
  });

  it("the known content of a made-up sample is found by additions", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 50, noNaN: true }), (content) => {
        const added = [0, 1, 2, 4];
        const ours = standardAddition({ added, signals: added.map((more) => 3 * (content + more)) });
        expect(ours.content).toBeCloseTo(content, 8);
      }),
    );
    expect(() => standardAddition({ added: [0, 1, 2], signals: [3, 2, 1] })).toThrow(/rise/);
  });
});
