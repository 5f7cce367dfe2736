import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  dayBounds,
  epochToLocal,
  formatDay,
  formatLocal,
  isCalendarDay,
  localToEpoch,
  operationalDayOf,
} from "@/lib/zone";

const LONDON = "Europe/London";
const HOUR = 3_600_000;

/** Oracle: the runtime's own Intl tables, another implementation than the one under test. */
function byIntl(ms: number, zone: string): string {
  const parts = new Intl.DateTimeFormat("en-GB", {
    timeZone: zone,
    dateStyle: "short",
    timeStyle: "medium",
    hourCycle: "h23",
  }).formatToParts(ms);
  const part = (type: string) => parts.find((each) => each.type === type)?.value ?? "";
  return `${part("year")}-${part("month")}-${part("day")} ${part("hour")}:${part("minute")}:${part("second")}`;
}

describe("localToEpoch", () => {
  it("reads an ordinary time as one moment", () => {
    expect(localToEpoch({ on: "2026-01-15", at: "12:00", zone: LONDON })).toEqual({
      kind: "one",
      epochMs: Date.UTC(2026, 0, 15, 12),
      offset: "+00:00",
    });
    expect(localToEpoch({ on: "2026-07-15", at: "12:00:07.250", zone: LONDON })).toMatchObject({
      epochMs: Date.UTC(2026, 6, 15, 11, 0, 7, 250),
    });
  });

  // Summer Time Order 2002 (UK): clocks change at 01:00 GMT on the last Sundays of March and October.
  it("names both moments of the hour that the clock shows twice", () => {
    expect(localToEpoch({ on: "2026-10-25", at: "01:30", zone: LONDON })).toEqual({
      kind: "doubled",
      earlier: { epochMs: Date.UTC(2026, 9, 25, 0, 30), offset: "+01:00" },
      later: { epochMs: Date.UTC(2026, 9, 25, 1, 30), offset: "+00:00" },
    });
  });

  it("settles the doubled hour once somebody has said which", () => {
    const at = (disambiguation: "earlier" | "later") =>
      localToEpoch({ on: "2026-10-25", at: "01:30", zone: LONDON, disambiguation });
    expect(at("earlier")).toMatchObject({ kind: "one", epochMs: Date.UTC(2026, 9, 25, 0, 30) });
    expect(at("later")).toMatchObject({ kind: "one", epochMs: Date.UTC(2026, 9, 25, 1, 30) });
  });

  it("says that the skipped hour never was, whatever was answered", () => {
    for (const disambiguation of [undefined, "earlier", "later"] as const) {
      expect(localToEpoch({ on: "2026-03-29", at: "01:30", zone: LONDON, disambiguation })).toEqual({
        kind: "missing",
        earlier: { epochMs: Date.UTC(2026, 2, 29, 0, 30), offset: "+00:00" },
        later: { epochMs: Date.UTC(2026, 2, 29, 1, 30), offset: "+01:00" },
      });
    }
  });

  it("keeps the edges of both hours apart", () => {
    const kind = (on: string, at: string) => localToEpoch({ on, at, zone: LONDON }).kind;
    expect([
      kind("2026-10-25", "00:59:59.999"),
      kind("2026-10-25", "01:00"),
      kind("2026-10-25", "01:59:59.999"),
    ]).toEqual(["one", "doubled", "doubled"]);
    expect([kind("2026-10-25", "02:00"), kind("2026-03-29", "00:59"), kind("2026-03-29", "01:00")]).toEqual([
      "one",
      "one",
      "missing",
    ]);
    expect(kind("2026-03-29", "02:00")).toBe("one");
  });

  it("refuses days, times and zones that are not", () => {
    for (const [on, at, zone] of [
      ["2026-02-30", "12:00", LONDON],
      ["26-02-03", "12:00", LONDON],
      ["2026-02-03", "24:00", LONDON],
      ["2026-02-03", "7:00", LONDON],
      ["2026-02-03", "12:00", "Nowhere/Land"],
    ] as const) {
      expect(() => localToEpoch({ on, at, zone })).toThrow(RangeError);
    }
  });
});

const zones = fc.constantFrom(
  LONDON,
  "America/New_York",
  "Australia/Lord_Howe",
  "Asia/Kathmandu",
  "UTC",
  "America/Santiago",
);
const moments = fc.integer({ min: Date.UTC(2000, 0, 1), max: Date.UTC(2030, 0, 1) });

describe("epochToLocal", () => {
  it("shows what the runtime's own zone tables show", () => {
    fc.assert(
      fc.property(moments, zones, (ms, zone) => {
        const local = epochToLocal(ms - (ms % 1000), zone);
        const at = local.at.length === 5 ? `${local.at}:00` : local.at;
        expect(`${local.on} ${at}`).toBe(byIntl(ms, zone));
      }),
    );
  });

  it("is undone by localToEpoch for every moment", () => {
    fc.assert(
      fc.property(moments, zones, (ms, zone) => {
        const { on, at } = epochToLocal(ms, zone);
        const back = localToEpoch({ on, at, zone });
        const found = back.kind === "one" ? [back.epochMs] : [back.earlier.epochMs, back.later.epochMs];
        expect(back.kind).not.toBe("missing");
        expect(found).toContain(ms);
      }),
    );
  });
});

describe("the operational day", () => {
  it("gives a night round to the day on which it began", () => {
    expect(operationalDayOf(Date.UTC(2026, 0, 15, 5, 59), LONDON, 360)).toBe("2026-01-14");
    expect(operationalDayOf(Date.UTC(2026, 0, 15, 6, 0), LONDON, 360)).toBe("2026-01-15");
  });

  it("lasts 23 hours in March and 25 in October", () => {
    const hours = (on: string) => {
      const { fromAt, toAt } = dayBounds(on, LONDON, 0);
      return (toAt - fromAt) / HOUR;
    };
    expect([hours("2026-03-29"), hours("2026-06-01"), hours("2026-10-25")]).toEqual([23, 24, 25]);
  });

  it("holds every moment in exactly the day it is said to belong to", () => {
    fc.assert(
      fc.property(moments, zones, fc.integer({ min: 0, max: 1439 }), (ms, zone, cut) => {
        const { fromAt, toAt } = dayBounds(operationalDayOf(ms, zone, cut), zone, cut);
        expect(fromAt <= ms && ms < toAt).toBe(true);
      }),
    );
  });

  it("holds moments around clock changes with a cut inside the doubled hour", () => {
    for (let minutes = -180; minutes <= 180; minutes += 5) {
      const ms = Date.UTC(2026, 9, 25, 1) + minutes * 60_000;
      const { fromAt, toAt } = dayBounds(operationalDayOf(ms, LONDON, 90), LONDON, 90);
      expect(fromAt <= ms && ms < toAt).toBe(true);
    }
  });

  it("refuses a cut outside the day", () => {
    expect(() => dayBounds("2026-01-01", LONDON, 1440)).toThrow(RangeError);
  });
});

describe("formatLocal", () => {
  it("writes moments in the facility's zone", () => {
    const ms = Date.UTC(2026, 6, 4, 8, 5, 9);
    expect(formatLocal(ms, LONDON)).toBe("4 Jul 2026, 09:05");
    expect(formatLocal(ms, LONDON, "second")).toBe("4 Jul 2026, 09:05:09");
    expect(formatLocal(ms, LONDON, "day")).toBe("4 Jul 2026");
    expect(formatLocal(ms, LONDON, "time")).toBe("09:05");
    expect(formatDay("2026-07-04")).toBe("4 Jul 2026");
  });

  it("tells the two readings of a doubled hour apart", () => {
    expect(formatLocal(Date.UTC(2026, 9, 25, 0, 30), LONDON)).toBe("25 Oct 2026, 01:30 (UTC+01:00)");
    expect(formatLocal(Date.UTC(2026, 9, 25, 1, 30), LONDON)).toBe("25 Oct 2026, 01:30 (UTC+00:00)");
  });
});

it("knows which days exist", () => {
  expect(["2024-02-29", "2026-02-29", "1900-02-29", "2026-1-1"].map(isCalendarDay)).toEqual([
    true,
    false,
    false,
    false,
  ]);
});
