import { describe, expect, it } from "vitest";
import type { FileAnswers, RawCell, SerialEpoch } from "@/modules/imports/model";
import { fromSerial, SERIAL_EPOCH_DIFFERENCE } from "@/modules/imports/rules/excel-serial";
import { parseDateText, parseTimeText } from "@/modules/imports/rules/parse-date-text";
import { parseMoment } from "@/modules/imports/rules/parse-moment";

const at = (
  moment: RawCell,
  answers: FileAnswers = {},
  more: { zone?: string; serialEpoch?: SerialEpoch; timeOfDay?: string } = {},
) =>
  parseMoment(
    { moment },
    {
      zone: more.zone ?? "Europe/London",
      serialEpoch: more.serialEpoch ?? 1900,
      answers,
      defaults: more.timeOfDay ? { timeOfDay: more.timeOfDay } : {},
    },
  );
const utc = (cell: RawCell, answers: FileAnswers = {}, more: Parameters<typeof at>[2] = {}) => {
  const found = at(cell, answers, more);
  return found.kind === "moment" ? new Date(found.epochMs).toISOString() : found.kind;
};
const code = (cell: RawCell, answers: FileAnswers = {}) => {
  const found = at(cell, answers);
  return found.kind === "refused" ? found.code : found.kind;
};

describe("fromSerial", () => {
  // Source: ECMA-376 part 1, 18.17.4 (both date systems); worked values in the reference's table.
  it("reads the 1900 system with its phantom day", () => {
    const read = [1, 59, 60, 61, 1462, 25569, 36526, 45000.760416666664, 44197.99999421296].map((serial) => {
      const found = fromSerial(serial, 1900);
      return found.kind === "moment" ? `${found.on} ${found.at}` : found.kind;
    });
    expect(read).toEqual([
      "1900-01-01 00:00",
      "1900-02-28 00:00",
      "phantom",
      "1900-03-01 00:00",
      "1904-01-01 00:00",
      "1970-01-01 00:00",
      "2000-01-01 00:00",
      "2023-03-15 18:15",
      "2021-01-01 23:59:59",
    ]);
  });

  it("reads the 1904 system", () => {
    const read = [0, 1, 1461, 24107, 35064, 43538.760416666664].map((serial) => {
      const found = fromSerial(serial, 1904);
      return found.kind === "moment" ? `${found.on} ${found.at}` : found.kind;
    });
    expect(read).toEqual([
      "1904-01-01 00:00",
      "1904-01-02 00:00",
      "1908-01-01 00:00",
      "1970-01-01 00:00",
      "2000-01-01 00:00",
      "2023-03-15 18:15",
    ]);
    expect(SERIAL_EPOCH_DIFFERENCE).toBe(1462);
  });

  it("refuses numbers that are no day", () => {
    expect([-1, Number.NaN, 2_958_466].map((serial) => fromSerial(serial, 1900).kind)).toEqual([
      "out-of-range",
      "out-of-range",
      "out-of-range",
    ]);
    expect(fromSerial(0.5, 1900)).toEqual({ kind: "time", at: "12:00" });
    expect(fromSerial(60.5, 1900)).toEqual({ kind: "phantom" });
  });
});

describe("parseDateText and parseTimeText", () => {
  it("reads dates in words and in figures", () => {
    for (const text of [
      "2026-03-14",
      "2026/3/14",
      "20260314",
      "14 Mar 2026",
      "14-Mar-2026",
      "14th March 2026",
    ]) {
      expect(parseDateText(text)).toMatchObject({ dayFirst: "2026-03-14", monthFirst: "2026-03-14" });
    }
    for (const text of ["March 14, 2026", "Mar 14 2026", "Saturday 14 March 2026", "Sat, 14 Mar 2026"]) {
      expect(parseDateText(text)).toMatchObject({ dayFirst: "2026-03-14" });
    }
    expect(parseDateText("14.03.2026")).toMatchObject({ dayFirst: "2026-03-14", monthFirst: null });
  });

  it("refuses years of two digits, days that are not, and what is no date", () => {
    expect(
      ["14/03/26", "14 Mar 26", "2026-02-30", "31/02/2026", "soon", "2026-13-01"].map((text) => code(text)),
    ).toEqual(["two-digit-year", "two-digit-year", "bad-date", "bad-date", "bad-date", "bad-date"]);
  });

  it("reads times of day on both clocks", () => {
    const times = ["14:05", "2:05 pm", "2:05:07PM", "14.05", "1405", "12 am", "12:30 p.m.", "09:00:00.25"];
    expect(times.map((text) => parseTimeText(text))).toMatchObject([
      { at: "14:05" },
      { at: "14:05" },
      { at: "14:05:07" },
      { at: "14:05" },
      { at: "14:05" },
      { at: "00:00" },
      { at: "12:30" },
      { at: "09:00:00.250" },
    ]);
    expect(["25:00", "24:00", "12:60", "13:00 pm", "noon"].map((text) => parseTimeText(text).kind)).toEqual(
      Array(5).fill("refused"),
    );
  });
});

describe("parseMoment", () => {
  it("takes times without an offset for the facility's and obeys an offset", () => {
    expect(utc("2026-07-14 14:05")).toBe("2026-07-14T13:05:00.000Z");
    expect(utc("2026-07-14T14:05:00Z")).toBe("2026-07-14T14:05:00.000Z");
    expect(utc("2026-07-14T14:05+05:45")).toBe("2026-07-14T08:20:00.000Z");
    expect(utc("2026-07-14T14:05-0330")).toBe("2026-07-14T17:35:00.000Z");
  });

  it("asks for the order of day and month only where both give a day", () => {
    expect(at("03/04/2026 09:00")).toMatchObject({
      kind: "two-orders",
      dayFirst: { dayFirst: "2026-04-03" },
      monthFirst: { monthFirst: "2026-03-04" },
    });
    expect([utc("14/03/2026 09:00"), utc("03/14/2026 09:00"), utc("03/03/2026 09:00")]).toEqual([
      "2026-03-14T09:00:00.000Z",
      "2026-03-14T09:00:00.000Z",
      "2026-03-03T09:00:00.000Z",
    ]);
  });

  it("reads all dates of a file in the order that was answered and refuses those that do not fit", () => {
    expect(utc("03/04/2026 09:00", { dateOrder: "month-first" })).toBe("2026-03-04T09:00:00.000Z");
    expect(utc("03/04/2026 09:00", { dateOrder: "day-first" })).toBe("2026-04-03T08:00:00.000Z");
    expect(code("14/03/2026 09:00", { dateOrder: "month-first" })).toBe("date-order");
  });

  it("reads workbook dates of both epochs", () => {
    const serial = (value: number): RawCell => ({ kind: "serial", value, showsTime: false });
    expect(utc(serial(45000.760416666664))).toBe("2023-03-15T18:15:00.000Z");
    expect(utc(serial(43538.760416666664), {}, { serialEpoch: 1904 })).toBe("2023-03-15T18:15:00.000Z");
    expect(utc(45000.760416666664)).toBe("2023-03-15T18:15:00.000Z");
    expect(code(serial(60.4))).toBe("phantom-day");
    expect(code(serial(45000))).toBe("missing-moment");
    expect(utc({ kind: "serial", value: 45000, showsTime: true })).toBe("2023-03-15T00:00:00.000Z");
    expect([code(8.12), code("45000.76"), code({ kind: "serial", value: -3, showsTime: true })]).toEqual(
      Array(3).fill("bad-date"),
    );
  });

  it("puts a day and a time of day together, workbook cells too", () => {
    const context = { zone: "UTC", serialEpoch: 1900 as const, answers: {}, defaults: {} };
    const joined = parseMoment(
      {
        date: { kind: "serial", value: 45000, showsTime: false },
        time: { kind: "serial", value: 0.75, showsTime: true },
      },
      context,
    );
    expect(joined).toMatchObject({ epochMs: Date.UTC(2023, 2, 15, 18) });
    expect(parseMoment({ date: "2023-03-15", time: "6:00 pm" }, context)).toMatchObject({
      epochMs: Date.UTC(2023, 2, 15, 18),
      text: "2023-03-15 6:00 pm",
    });
    expect(parseMoment({ date: "2023-03-15", time: "late" }, context)).toMatchObject({ code: "bad-time" });
  });

  it("wants a time of day, or a person's word for it", () => {
    expect(code("2026-03-14")).toBe("missing-moment");
    expect(code("")).toBe("missing-moment");
    expect(at("2026-03-14", {}, { timeOfDay: "08:00" })).toMatchObject({
      kind: "moment",
      isTimeMissing: true,
    });
  });

  it("names both readings of the doubled hour and takes the answer", () => {
    expect(at("2026-10-25 01:30")).toMatchObject({
      kind: "doubled",
      earlier: { epochMs: Date.UTC(2026, 9, 25, 0, 30) },
      later: { epochMs: Date.UTC(2026, 9, 25, 1, 30) },
    });
    expect(utc("2026-10-25 01:30", { doubledHour: "later" })).toBe("2026-10-25T01:30:00.000Z");
    expect(utc("2026-10-25 01:30", { doubledHour: "earlier" })).toBe("2026-10-25T00:30:00.000Z");
    expect(code("2026-10-25 01:30", { doubledHour: "refuse" })).toBe("doubled-hour");
    expect(utc("2026-10-25T01:30+01:00")).toBe("2026-10-25T00:30:00.000Z");
  });

  it("refuses the missing hour with both candidates, and each mend it offers works", () => {
    const found = at("2026-03-29 01:30");
    expect(found).toMatchObject({ kind: "refused", code: "missing-hour" });
    expect(found.kind === "refused" && found.reason).toContain("00:30 or 02:30");
    const offered = found.kind === "refused" ? (found.mend.match(/01:30[+-]\d\d:\d\d/g) ?? []) : [];
    expect(offered.map((time) => utc(`2026-03-29T${time}`))).toEqual([
      "2026-03-29T00:30:00.000Z",
      "2026-03-29T01:30:00.000Z",
    ]);
  });
});
