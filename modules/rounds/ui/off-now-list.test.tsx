import { render, screen } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { rowInUnit } from "@/modules/measurements/model";
import { aReading, aWatchRow } from "@/tests/support/watch-row";
import { offNow } from "../rules/off-now";
import { OffNowList } from "./off-now-list";

const SENTENCE = "16.2 °C is above the upper tolerance limit (15.0 °C).";

const row = aWatchRow({
  acceptedUnits: ["°C", "°F"],
  bounds: { toleranceLow: 12, toleranceHigh: 15 },
  recent: [aReading({ value: 16.2, takenAt: 1000, status: "out", side: "high", sentence: SENTENCE })],
});

describe("what is off now, as a person reads it", () => {
  // 1.8 × 16.2 + 32 = 61.16 °F; 12 to 15 °C = 53.6 to 59.0 °F
  it("shows value and limits in the unit of the row; the stored judgement keeps its words", () => {
    render(
      <OffNowList items={offNow([rowInUnit(row, "°F")])} names={{ 1: "Joe" }} now={2000} mayEnter={false} />,
    );
    expect(screen.getByRole("listitem").textContent).toContain("61.2°F");
    expect(screen.getByRole("img").getAttribute("aria-label")).toBe(
      "Temperature 61.2 °F, out of tolerance; tolerance 53.6 to 59.0",
    );
    expect(screen.getByText(SENTENCE)).toBeTruthy();
  });
});
