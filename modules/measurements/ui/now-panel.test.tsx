import { render, screen } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { aReading, aWatchRow } from "@/tests/support/watch-row";
import { rowInUnit, type WatchRow } from "../model";
import { NowPanel } from "./now-panel";

function show(row: WatchRow) {
  render(
    <NowPanel
      rows={[row]}
      shown={null}
      hrefOf={() => "/systems/KELP-01"}
      people={new Map()}
      zone="Europe/London"
      now={2000}
    />,
  );
  return screen.getByRole("listitem").textContent;
}

describe("how a system stands now", () => {
  // 1.8 × 13.4 + 32 = 56.12 °F; 12 to 15 °C = 53.6 to 59.0 °F
  it("is read in the unit of the row that it is given, value and limits alike", () => {
    const row = aWatchRow({
      acceptedUnits: ["°C", "°F"],
      bounds: { toleranceLow: 12, toleranceHigh: 15 },
      recent: [aReading({ value: 13.4, takenAt: 1000 })],
    });
    expect(show(rowInUnit(row, "°F"))).toContain("56.1°F");
    expect(screen.getByRole("img").getAttribute("aria-label")).toBe(
      "Temperature 56.1 °F, within; tolerance 53.6 to 59.0",
    );
  });

  it("keeps the digits of a detection limit", () => {
    const row = aWatchRow({
      unit: "mg/L",
      acceptedUnits: ["mg/L"],
      decimals: 1,
      recent: [aReading({ value: 0.05, qualifier: "<", takenAt: 1000 })],
    });
    expect(show(row)).toContain("<0.05mg/L");
  });
});
