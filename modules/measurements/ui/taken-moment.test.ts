import { describe, expect, it } from "vitest";
import { readTakenAt } from "./taken-moment";

const ZONE = "Europe/London";
const NOW = Date.UTC(2026, 10, 1, 12, 0);

describe("taken at", () => {
  it("means now while it is empty", () => {
    expect(readTakenAt("", ZONE, NOW, null)).toEqual({ ok: true, at: null });
  });

  // British Summer Time is UTC+1: 09:00 on 14 July is 08:00 UTC.
  it("is read in the facility's zone", () => {
    expect(readTakenAt("2026-07-14T09:00", ZONE, NOW, null)).toEqual({
      ok: true,
      at: Date.UTC(2026, 6, 14, 8, 0),
    });
  });

  // The clocks of the United Kingdom went back on 25 October 2026 at 02:00 summer time (Summer Time Order 2002).
  it("asks which of two is meant in the doubled hour, and takes the answer", () => {
    expect(readTakenAt("2026-10-25T01:30", ZONE, NOW, null)).toMatchObject({ ok: false, kind: "doubled" });
    expect(readTakenAt("2026-10-25T01:30", ZONE, NOW, "earlier")).toEqual({
      ok: true,
      at: Date.UTC(2026, 9, 25, 0, 30),
    });
    expect(readTakenAt("2026-10-25T01:30", ZONE, NOW, "later")).toEqual({
      ok: true,
      at: Date.UTC(2026, 9, 25, 1, 30),
    });
  });

  it("refuses a time that the clock left out, the future, and half a moment", () => {
    expect(readTakenAt("2026-03-29T01:30", ZONE, NOW, null)).toMatchObject({ ok: false, kind: "wrong" });
    expect(readTakenAt("2026-11-01T12:30", ZONE, NOW, null)).toMatchObject({ ok: false, kind: "wrong" });
    expect(readTakenAt("2026-07-14", ZONE, NOW, null)).toMatchObject({ ok: false, kind: "wrong" });
  });
});
