import { describe, expect, it } from "vitest";
import { aReading, aWatchRow, HOUR } from "@/tests/support/watch-row";
import { judgeTyped, shortGround } from "../ui/judge-typed";
import { verdictInUnit } from "./verdict-in-unit";

const NOW = Date.UTC(2026, 2, 2, 9, 0);

function inFahrenheit(row: ReturnType<typeof aWatchRow>, text: string) {
  const found = judgeTyped(row, { text, unit: "°F", takenAt: NOW });
  if (found.state !== "judged") throw new Error("it is judged");
  const shown = verdictInUnit(found.verdict, found.value, row.parameter, "°F");
  return { canonical: found.verdict, shown, ground: shortGround(shown, 1, true) };
}

describe("a verdict in the unit that is typed", () => {
  const row = aWatchRow({ acceptedUnits: ["°C", "°F"], bounds: { toleranceHigh: 18 } });

  // 18 °C = 64.4 °F exactly
  it("says the limit in that unit and keeps the status that the canonical value has", () => {
    const { canonical, shown, ground } = inFahrenheit(row, "64.6");
    expect(canonical.status).toBe("out");
    expect(shown).toMatchObject({ status: "out", side: "high" });
    expect(shown.sentence).toBe("64.6\u00a0°F is above the upper tolerance limit (64.4\u00a0°F).");
    expect(ground).toBe("above 64.4");
  });

  it("never shows a value and the limit that it passes alike", () => {
    const { shown, ground } = inFahrenheit(row, "64.41");
    expect(shown.sentence).toContain("64.41\u00a0°F is above the upper tolerance limit (64.40\u00a0°F)");
    expect(ground).toBe("above 64.40");
  });

  // 20 °C = 68 °F; 71.6 °F = 22 °C; a difference of 2 °C is 3.6 °F, one of 1 °C 1.8 °F
  it("says a change as a difference, without the zero point of the unit", () => {
    const changing = aWatchRow({
      acceptedUnits: ["°C", "°F"],
      bounds: { greatestChange24h: 1 },
      recent: [aReading({ value: 20, takenAt: NOW - HOUR })],
    });
    const { shown, ground } = inFahrenheit(changing, "71.6");
    expect(shown.status).toBe("out");
    expect(shown.sentence).toContain("differs by 3.6\u00a0°F from 68.0\u00a0°F");
    expect(shown.sentence).toContain("at most 1.8\u00a0°F is allowed");
    expect(ground).toBe("changed by 3.6 in 24 h");
  });

  it("stays as it is in the canonical unit", () => {
    const found = judgeTyped(row, { text: "19", unit: "°C", takenAt: NOW });
    if (found.state !== "judged") throw new Error("it is judged");
    expect(verdictInUnit(found.verdict, found.value, row.parameter, "°C")).toBe(found.verdict);
    expect(verdictInUnit(found.verdict, found.value, row.parameter, null)).toBe(found.verdict);
  });
});
