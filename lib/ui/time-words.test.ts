import { describe, expect, it } from "vitest";
import { agoText, timeText } from "./time-words";

// Offsets: British Summer Time is UTC+1 from the last Sunday of March to the last of October (Summer Time Order 2002).
const summer = Date.UTC(2026, 6, 14, 8, 42);

describe("a moment on screen", () => {
  it("is written in the facility's zone, whatever the device's", () => {
    expect(timeText(summer, "Europe/London", "time")).toBe("09:42");
    expect(timeText(Date.UTC(2026, 0, 14, 8, 42), "Europe/London", "time")).toBe("08:42");
    expect(timeText(summer, "Pacific/Auckland", "day-time")).toBe("14 Jul 2026, 20:42");
  });
  it("names the weekday, cuts every month to three letters, and writes midnight as 00", () => {
    expect(timeText(summer, "Europe/London", "weekday")).toBe("Tue 14 Jul");
    expect(timeText(Date.UTC(2026, 8, 1), "UTC", "day")).toBe("1 Sep 2026");
    expect(timeText(Date.UTC(2026, 8, 1), "UTC", "time")).toBe("00:00");
  });
  it("refuses an unknown zone and a moment that is none", () => {
    expect(() => timeText(summer, "Atlantis/Deep", "time")).toThrow(RangeError);
    expect(() => timeText(Number.NaN, "UTC", "time")).toThrow(RangeError);
  });
  it("says how long ago in one word", () => {
    expect(agoText(0, 59_000)).toBe("just now");
    expect(agoText(0, 20 * 3_600_000)).toBe("20 h ago");
    expect(agoText(0, 72 * 3_600_000)).toBe("3 days ago");
    expect(agoText(60_000, 0)).toBe("in the future");
  });
});
