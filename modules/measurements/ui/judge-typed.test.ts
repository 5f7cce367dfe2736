import { describe, expect, it } from "vitest";
import { aReading, aWatchRow, HOUR } from "@/tests/support/watch-row";
import { applySlip, judgeTyped, shortGround, slipLabel } from "./judge-typed";

const NOW = Date.UTC(2026, 2, 2, 9, 0);
const typed = (text: string, unit: string | null = null) => ({ text, unit, takenAt: NOW });

const temperature = (more: Parameters<typeof aWatchRow>[0] = {}) =>
  aWatchRow({ code: "temperature", unit: "°C", acceptedUnits: ["°C", "°F"], decimals: 1, ...more });

describe("judging what is typed", () => {
  // 64.4 °F = (64.4 − 32) / 1.8 = 18 °C exactly; the limit is inclusive.
  it("finds 64.4 °F within an upper limit of 18 °C", () => {
    const row = temperature({ bounds: { toleranceHigh: 18 } });
    const found = judgeTyped(row, typed("64.4", "°F"));
    expect(found).toMatchObject({ state: "judged", verdict: { status: "within" }, mustBeConfirmed: false });
  });

  it("takes a comma as it takes a point", () => {
    const row = temperature({ bounds: { toleranceHigh: 18 } });
    expect(judgeTyped(row, typed("18,1", "°C"))).toMatchObject({
      state: "judged",
      value: { value: 18.1 },
      verdict: { status: "out", side: "high" },
      mustBeConfirmed: true,
    });
  });

  it("compares with every reading of the last 24 h, not with the last alone", () => {
    const row = temperature({
      bounds: { greatestChange24h: 1 },
      recent: [
        aReading({ value: 24.6, takenAt: NOW - 6 * HOUR }),
        aReading({ value: 24, takenAt: NOW - 12 * HOUR }),
      ],
    });
    const found = judgeTyped(row, typed("25.2", "°C"));
    expect(found).toMatchObject({ state: "judged", verdict: { status: "out", side: "change" } });
    if (found.state === "judged") expect(shortGround(found.verdict, 1)).toBe("changed by 1.2 in 24 h");
  });

  it("counts a reading that was sent since the page was loaded", () => {
    const row = temperature({ bounds: { greatestChange24h: 1 } });
    const sent = [{ id: "sent", takenAt: NOW - HOUR, value: 20, qualifier: "" as const }];
    expect(judgeTyped(row, typed("21.5", "°C"))).toMatchObject({ verdict: { status: "within" } });
    expect(judgeTyped(row, typed("21.5", "°C"), sent)).toMatchObject({ verdict: { status: "out" } });
  });

  it("does not compare with an implausible reading", () => {
    const row = temperature({
      bounds: { greatestChange24h: 1 },
      recent: [aReading({ value: 81.2, takenAt: NOW - HOUR, status: "implausible" })],
    });
    expect(judgeTyped(row, typed("20", "°C"))).toMatchObject({ verdict: { status: "within" } });
  });

  it("cannot judge <0.05 against 0.0075", () => {
    const row = aWatchRow({
      unit: "mg/L",
      acceptedUnits: ["mg/L"],
      decimals: 3,
      bounds: { toleranceHigh: 0.0075 },
    });
    expect(judgeTyped(row, typed("<0.05", "mg/L"))).toMatchObject({
      verdict: { status: "unjudged" },
      mustBeConfirmed: false,
    });
  });

  it("says what to write where there is no value in it", () => {
    expect(judgeTyped(temperature(), typed("warm", "°C"))).toMatchObject({ state: "wrong" });
    expect(judgeTyped(temperature(), typed("  ", "°C"))).toEqual({ state: "empty" });
  });

  it("leaves a unit that needs more than a factor to the server, and says so", () => {
    const row = aWatchRow({ unit: "psu", acceptedUnits: ["psu", "SG 25/25 °C"], decimals: 1 });
    expect(judgeTyped(row, typed("1.026", "SG 25/25 °C"))).toMatchObject({ state: "left-to-server" });
  });
});

describe("slips", () => {
  const ph = () =>
    aWatchRow({
      unit: "pH",
      acceptedUnits: ["pH"],
      decimals: 2,
      plausible: { low: 0, high: 14 },
      recent: [8.1, 8.12, 8.09, 8.11, 8.1].map((value, index) =>
        aReading({ value, takenAt: NOW - (index + 1) * 25 * HOUR }),
      ),
    });

  it("offers 8.12 for 81.2 and keeps the person's comma", () => {
    const found = judgeTyped(ph(), typed("81,2", "pH"));
    if (found.state !== "judged") throw new Error("it is a number");
    const [slip] = found.slips;
    if (!slip) throw new Error("a slip is offered");
    expect(found.verdict.status).toBe("implausible");
    expect(slipLabel(typed("81,2", "pH"), slip)).toBe("8,12?");
    expect(applySlip(typed("81,2", "pH"), slip).text).toBe("8,12");
  });

  it("doubts nothing that is usual", () => {
    expect(judgeTyped(ph(), typed("8.11", "pH"))).toMatchObject({ slips: [] });
  });
});

describe("short grounds", () => {
  it("shows a small limit with all its digits", () => {
    const row = aWatchRow({
      unit: "mg/L",
      acceptedUnits: ["mg/L"],
      decimals: 2,
      bounds: { toleranceHigh: 0.0075 },
    });
    const found = judgeTyped(row, typed("0.01", "mg/L"));
    if (found.state !== "judged") throw new Error("it is a number");
    expect(shortGround(found.verdict, 2)).toBe("above 0.0075");
  });
});
