import { describe, expect, it } from "vitest";
import type { LimitShape } from "../model";
import {
  type BoundField,
  type DraftKnot,
  draftOf,
  emptyDraft,
  type LimitDraft,
  momentOf,
  readDraft,
  withKind,
} from "./limit-draft";

const ZONE = "Europe/London";
const TEMPERATURE = { plausible: { low: -2, high: 45 }, decimals: 1 };
const dayOf = (at: number) => new Date(at).toISOString().slice(0, 10);

const knot = (texts: Partial<Record<BoundField, string>>, when = ""): DraftKnot => ({
  when,
  texts: { ...(emptyDraft().knots[0] as DraftKnot).texts, ...texts },
});
const draft = (kind: LimitDraft["kind"], ...knots: DraftKnot[]): LimitDraft => ({
  kind,
  knots,
  suspendedReason: "",
});
const problemsOf = (typed: LimitDraft) => {
  const read = readDraft(typed, TEMPERATURE, ZONE);
  return read.ok ? [] : read.problems;
};

describe("limits as typed", () => {
  it("are read with comma or point, and an empty cell is an open side", () => {
    const read = readDraft(
      draft("constant", knot({ target: "11,5", toleranceHigh: " 14 " })),
      TEMPERATURE,
      ZONE,
    );
    expect(read).toEqual({
      ok: true,
      shape: { kind: "constant", bounds: { target: 11.5, toleranceHigh: 14 } },
      suspendedReason: null,
    });
  });

  it("in the wrong order are refused at both cells, with both names", () => {
    const [problem] = problemsOf(draft("constant", knot({ watchHigh: "15", toleranceHigh: "14" })));
    expect(problem?.fields).toEqual(["watchHigh", "toleranceHigh"]);
    expect(problem?.sentence).toContain("upper watch limit (15.0) is above the upper tolerance limit (14.0)");
  });

  it("that are no numbers, implausible, or none at all are refused at their cell", () => {
    expect(problemsOf(draft("constant", knot({ target: "warm" })))).toMatchObject([{ fields: ["target"] }]);
    expect(problemsOf(draft("constant", knot({ target: "90" })))).toMatchObject([{ fields: ["target"] }]);
    expect(problemsOf(emptyDraft())[0]?.sentence).toContain("State at least one");
  });

  it("as a ramp run from day to day in the facility's zone", () => {
    const read = readDraft(
      draft("ramp", knot({ target: "12" }, "2026-03-01"), knot({ target: "16" }, "2026-06-01")),
      TEMPERATURE,
      ZONE,
    );
    // London: UTC in March, one hour ahead in June (IANA tz database)
    expect(read).toMatchObject({
      ok: true,
      shape: {
        kind: "ramp",
        knots: [
          { at: Date.UTC(2026, 2, 1), bounds: { target: 12 } },
          { at: Date.UTC(2026, 4, 31, 23), bounds: { target: 16 } },
        ],
      },
    });
  });

  it("as a ramp need their days, in order", () => {
    const typed = (first: string, second: string) =>
      problemsOf(draft("ramp", knot({ target: "12" }, first), knot({ target: "16" }, second)));
    expect(typed("2026-03-01", "")).toMatchObject([{ knot: 1, fields: ["when"] }]);
    expect(typed("2026-06-01", "2026-03-01")).toMatchObject([{ knot: 1, fields: ["when"] }]);
  });

  it("as a season need real days of the year", () => {
    const typed = (day: string) =>
      problemsOf(draft("season", knot({ target: "12" }, "01-01"), knot({ target: "16" }, day)));
    expect(typed("07-01")).toEqual([]);
    expect(typed("02-30")).toMatchObject([{ knot: 1, fields: ["when"] }]);
    expect(typed("01-01")).toMatchObject([{ knot: 1, fields: ["when"] }]);
  });

  it("suspended need a reason and nothing else", () => {
    const suspended = { ...emptyDraft(), kind: "suspended" as const };
    expect(problemsOf(suspended)).toMatchObject([{ fields: ["reason"] }]);
    expect(readDraft({ ...suspended, suspendedReason: "No animals" }, TEMPERATURE, ZONE)).toMatchObject({
      ok: true,
      suspendedReason: "No animals",
    });
  });

  it("are what they were when nothing is touched, a ramp's time of day included", () => {
    const shapes: LimitShape[] = [
      { kind: "constant", bounds: { toleranceLow: -1.5, target: 11, greatestChange24h: 0.25 } },
      {
        kind: "ramp",
        knots: [
          { at: Date.UTC(2026, 2, 1, 9, 30), bounds: { target: 12 } },
          { at: Date.UTC(2026, 5, 1), bounds: { target: 16 } },
        ],
      },
      {
        kind: "season",
        knots: [
          { monthDay: "01-01", bounds: { target: 9 } },
          { monthDay: "07-01", bounds: { target: 14 } },
        ],
      },
    ];
    for (const shape of shapes)
      expect(readDraft(draftOf(shape, dayOf), TEMPERATURE, ZONE)).toMatchObject({ ok: true, shape });
  });

  it("keep what is typed when their kind changes", () => {
    const ramp = withKind(draft("constant", knot({ target: "12" })), "ramp");
    expect(ramp.knots.map((each) => each.texts.target)).toEqual(["12", "12"]);
    expect(withKind(ramp, "constant").knots.map((each) => each.texts.target)).toEqual(["12"]);
  });
});

describe("a moment on the facility's clock", () => {
  it("that was never shown is the moment after the jump; one shown twice is the earlier", () => {
    // London 2026: clocks go forward on 29 March at 01:00, back on 25 October at 02:00 (IANA tz database)
    expect(momentOf("2026-03-29T01:30", ZONE)).toBe(Date.UTC(2026, 2, 29, 1, 30));
    expect(momentOf("2026-10-25T01:30", ZONE)).toBe(Date.UTC(2026, 9, 25, 0, 30));
    expect(momentOf("soon", ZONE)).toBeNull();
  });
});
