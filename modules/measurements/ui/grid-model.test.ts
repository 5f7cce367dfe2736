import { describe, expect, it } from "vitest";
import { aWatchRow } from "@/tests/support/watch-row";
import {
  cellBelow,
  cellBeside,
  completeAnswer,
  EMPTY_GRID,
  type GridState,
  handOver,
  isReady,
  layOutSheet,
  pasteBlock,
  putDraft,
  redo,
  undo,
  verdictAt,
} from "./grid-model";

const at = (pointId: number, id: number, more: Parameters<typeof aWatchRow>[0] = {}) =>
  aWatchRow({ pointId, systemCode: `KELP-0${pointId}`, id, name: `P${id}`, ...more });

/** Two points, two parameters; parameter 2 is not read at point 2. */
const SHEET = layOutSheet([at(1, 1), at(1, 2), at(2, 1), at(3, 1), at(3, 2)]);
const draft = (text: string) => ({ text, unit: "°C", block: null, confirmed: false });
const texts = (state: GridState) =>
  Object.fromEntries([...state.drafts].map(([key, each]) => [key, each.text]));

describe("the sheet", () => {
  it("has a row per point and a column per parameter in use, in the order in which points list them", () => {
    expect(SHEET.rows.map((row) => row.systemCode)).toEqual(["KELP-01", "KELP-02", "KELP-03"]);
    expect(SHEET.columns.map((column) => column.name)).toEqual(["P1", "P2"]);
  });

  it("shows the unit that most points use in the header", () => {
    const sheet = layOutSheet([at(1, 1), { ...at(2, 1), unit: "°F" }, at(3, 1)]);
    expect(sheet.columns[0]?.unit).toBe("°C");
  });

  it("goes down past what is not read and on to the top of the next column, and stops at the end", () => {
    expect(cellBelow(SHEET, 0, 1)).toEqual([2, 1]);
    expect(cellBelow(SHEET, 2, 0)).toEqual([0, 1]);
    expect(cellBelow(SHEET, 2, 1)).toBeNull();
    expect(cellBelow(SHEET, 0, 1, -1)).toEqual([2, 0]);
  });

  it("goes right past what is not read and on to the next row", () => {
    expect(cellBeside(SHEET, 0, 1)).toEqual([1, 0]);
    expect(cellBeside(SHEET, 1, 0)).toEqual([2, 0]);
    expect(cellBeside(SHEET, 2, 1)).toBeNull();
    expect(cellBeside(SHEET, 2, 0, -1)).toEqual([1, 0]);
  });
});

describe("undo of the unsent", () => {
  it("takes steps back and does them again", () => {
    let state = putDraft(putDraft(EMPTY_GRID, "1:1", draft("13")), "1:1", draft("14"));
    state = undo(state);
    expect(texts(state)).toEqual({ "1:1": "13" });
    state = undo(undo(state));
    expect(texts(state)).toEqual({});
    state = redo(redo(state));
    expect(texts(state)).toEqual({ "1:1": "14" });
    expect(redo(state)).toBe(state);
  });

  it("forgets what could be done again once something else is typed", () => {
    const state = putDraft(undo(putDraft(EMPTY_GRID, "1:1", draft("13"))), "1:1", draft("15"));
    expect(redo(state)).toBe(state);
  });

  it("never brings back a value that has been handed over", () => {
    let state = putDraft(putDraft(EMPTY_GRID, "1:1", draft("13")), "2:1", draft("99"));
    state = handOver(state, ["1:1"]);
    expect(texts(state)).toEqual({ "2:1": "99" });
    state = undo(state);
    expect(texts(state)).toEqual({});
    expect(undo(state)).toBe(state);
    expect(texts(redo(state))).toEqual({ "2:1": "99" });
  });

  it("takes a pasted block back in one step", () => {
    const { state } = pasteBlock(EMPTY_GRID, SHEET, { row: 0, column: 0 }, [["13", "34"], ["12"]]);
    expect(texts(undo(state))).toEqual({});
    expect(texts(redo(undo(state)))).toEqual({ "1:1": "13", "1:2": "34", "2:1": "12" });
  });
});

describe("a pasted block", () => {
  it("is laid from the cell in focus to the right and down; empty cells change nothing", () => {
    const before = putDraft(EMPTY_GRID, "1:2", draft("7"));
    const { state, placed, lost } = pasteBlock(before, SHEET, { row: 0, column: 0 }, [["13", ""], ["12"]]);
    expect(texts(state)).toEqual({ "1:1": "13", "1:2": "7", "2:1": "12" });
    expect({ placed, lost }).toEqual({ placed: 2, lost: [] });
  });

  it("names each value that finds no place, and shifts nothing", () => {
    const block = [
      ["13", "34", "1"],
      ["12", "33"],
      ["11", "32"],
      ["10", ""],
    ];
    const { state, placed, lost } = pasteBlock(EMPTY_GRID, SHEET, { row: 0, column: 0 }, block);
    expect(texts(state)).toEqual({ "1:1": "13", "1:2": "34", "2:1": "12", "3:1": "11", "3:2": "32" });
    expect(placed).toBe(5);
    expect(lost).toEqual([
      "“1” would lie beyond the last column",
      "“33”: P2 is not read at KELP-02",
      "“10” would lie beyond the last row",
    ]);
  });

  it("is ready only where each value can be read and what is off has been confirmed", () => {
    const sheet = layOutSheet([at(1, 1, { bounds: { toleranceHigh: 18 } }), at(2, 1)]);
    const { state } = pasteBlock(EMPTY_GRID, sheet, { row: 0, column: 0 }, [["19"], ["warm"]]);
    const ready = [...state.drafts].map(([key, each]) => isReady(each, verdictAt(sheet, key, each, 0, [])));
    expect(ready).toEqual([false, false]);
    const off = state.drafts.get("1:1");
    if (!off) throw new Error("it was laid there");
    expect(isReady({ ...off, confirmed: true }, verdictAt(sheet, "1:1", off, 0, []))).toBe(true);
  });
});

describe("answers", () => {
  const pump = at(1, 1, {
    kind: "choice",
    unit: null,
    choices: [
      { code: "on", label: "on", means: "within" },
      { code: "off", label: "off", means: "out" },
      { code: "not_seen", label: "not seen", means: "none" },
    ],
  });

  it("are completed from a beginning that fits one alone", () => {
    expect(completeAnswer("n", pump)).toBe("not seen");
    expect(completeAnswer("OF", pump)).toBe("off");
  });

  it("are left as typed where several fit, none fits, or a number is asked for", () => {
    expect(completeAnswer("o", pump)).toBe("o");
    expect(completeAnswer("x", pump)).toBe("x");
    expect(completeAnswer("1", at(1, 1))).toBe("1");
  });
});
