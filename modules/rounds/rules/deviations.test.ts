import { describe, expect, it } from "vitest";
import { HOUR_MS } from "@/lib/clock";
import type { Status } from "@/modules/measurements/model";
import type { SheetLine } from "../model";
import { deviationsOf } from "./deviations";

let next = 0;
function line(status: Status, more: Partial<SheetLine> = {}): SheetLine {
  next += 1;
  return {
    readingId: next,
    pointId: 1,
    parameterId: 1,
    systemCode: "KELP-01",
    pointCode: "surface",
    parameterCode: "temperature",
    typedText: "13.4",
    typedUnit: "°C",
    value: 13.4,
    qualifier: "",
    answer: null,
    takenAt: 0,
    enteredAt: 0,
    takenBy: 1,
    enteredBy: 1,
    methodId: null,
    instrumentId: null,
    note: null,
    supersedesId: null,
    correctionReason: null,
    isConfirmed: true,
    status,
    side: null,
    sentence: "",
    explanations: [{ text: "known", by: 1, at: 0 }],
    ...more,
  };
}

describe("the deviations of a sheet", () => {
  it("come gravest first and leave out what is well", () => {
    const lines = (["within", "unjudged", "watch", "none", "implausible", "out"] as const).map((status) =>
      line(status),
    );
    expect(deviationsOf(lines).map(({ line: each }) => each.status)).toEqual([
      "out",
      "implausible",
      "watch",
      "unjudged",
    ]);
  });

  it("keep the order of the walk among equals", () => {
    const lines = [line("out"), line("watch"), line("out")];
    expect(deviationsOf(lines).map(({ line: each }) => each.readingId)).toEqual(
      [lines[0], lines[2], lines[1]].map((each) => each?.readingId),
    );
  });

  it("name what is unconfirmed and unexplained only where it is off", () => {
    const bare = { isConfirmed: false, explanations: [] };
    expect(deviationsOf([line("out", bare)])[0]?.marks).toEqual(["unconfirmed", "unexplained"]);
    expect(deviationsOf([line("watch", bare)])[0]?.marks).toEqual([]);
    expect(deviationsOf([line("within", bare)])).toEqual([]);
  });

  it("hold corrections and late entries that are within, after everything that is off", () => {
    const lines = [
      line("within", { supersedesId: 7 }),
      line("none", { enteredAt: 12 * HOUR_MS + 1 }),
      line("watch"),
    ];
    expect(deviationsOf(lines).map(({ marks }) => marks)).toEqual([[], ["corrected"], ["late"]]);
    expect(deviationsOf([line("within", { enteredAt: 12 * HOUR_MS })])).toEqual([]);
  });
});
