import { describe, expect, it } from "vitest";
import { aWatchRow } from "@/tests/support/watch-row";
import { asCounted, asTyped, type ReadingVersion } from "./reading-view";

const version = (more: Partial<ReadingVersion>): ReadingVersion => ({
  id: 1,
  typedText: "",
  typedUnit: null,
  value: null,
  qualifier: "",
  answer: null,
  takenAt: 0,
  enteredAt: 0,
  takenBy: 1,
  enteredBy: 1,
  methodId: null,
  instrumentId: null,
  source: "entry",
  note: null,
  correctionReason: null,
  confirmedBy: null,
  confirmedAt: null,
  voidedBy: null,
  voidedAt: null,
  voidReason: null,
  ...more,
});
const temperature = aWatchRow({ unit: "°C", decimals: 1 }).parameter;

describe("a reading in words", () => {
  it("keeps what was typed, comma and unit included, beside what counts", () => {
    const typed = version({ typedText: "64,4", typedUnit: "°F", value: 18 });
    expect(asTyped(typed)).toBe("64,4\u00a0°F");
    expect(asCounted(typed, temperature)).toBe("18.0\u00a0°C");
  });

  it("keeps the qualifier of a censored value and shows ND without a unit", () => {
    expect(asCounted(version({ value: 0.05, qualifier: "<", typedText: "<0.05" }), temperature)).toBe(
      "<0.05\u00a0°C",
    );
    expect(asCounted(version({ qualifier: "ND", typedText: "nd" }), temperature)).toBe("ND");
  });

  it("shows the label of an answer", () => {
    const pump = aWatchRow({
      kind: "choice",
      unit: null,
      choices: [{ code: "not_seen", label: "not seen", means: "none" }],
    }).parameter;
    expect(asCounted(version({ answer: "not_seen", typedText: "not_seen" }), pump)).toBe("not seen");
  });
});
