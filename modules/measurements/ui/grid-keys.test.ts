import { describe, expect, it } from "vitest";
import { moveFor } from "./grid-keys";

const press = (
  key: string,
  more: Partial<Record<"shiftKey" | "ctrlKey" | "metaKey" | "altKey", boolean>> = {},
) => ({
  key,
  shiftKey: false,
  ctrlKey: false,
  metaKey: false,
  altKey: false,
  ...more,
});

describe("keys on the sheet", () => {
  it("Enter goes down and Tab right; with Shift the other way", () => {
    expect(moveFor(press("Enter"), true, true)).toEqual({ because: "enter", move: "down" });
    expect(moveFor(press("Enter", { shiftKey: true }), false, false)).toEqual({
      because: "enter",
      move: "up",
    });
    expect(moveFor(press("Tab"), true, true)).toEqual({ because: "tab", move: "right" });
    expect(moveFor(press("Tab", { shiftKey: true }), false, false)).toEqual({ because: "tab", move: "left" });
  });

  it("arrows leave a cell that was typed over, and move in the text of one that was opened", () => {
    expect(moveFor(press("ArrowLeft"), true, true)).toEqual({ because: "arrow", move: "left" });
    expect(moveFor(press("ArrowLeft"), true, false)).toBeNull();
    expect(moveFor(press("ArrowDown"), true, false)).toEqual({ because: "arrow", move: "down" });
  });

  it("undo and redo are the sheet's while nothing is being typed, else the text box's", () => {
    expect(moveFor(press("z", { ctrlKey: true }), false, false)).toMatchObject({ because: "undo" });
    expect(moveFor(press("y", { ctrlKey: true }), false, false)).toMatchObject({ because: "redo" });
    expect(moveFor(press("Z", { metaKey: true, shiftKey: true }), false, false)).toMatchObject({
      because: "redo",
    });
    expect(moveFor(press("z", { ctrlKey: true }), true, true)).toBeNull();
  });

  it("Delete empties, Escape drops what is typed and otherwise leaves the sheet, letters begin a value", () => {
    expect(moveFor(press("Delete"), false, false)).toMatchObject({ because: "clear" });
    expect(moveFor(press("Backspace"), true, true)).toBeNull();
    expect(moveFor(press("Escape"), true, true)).toBe("cancel");
    expect(moveFor(press("Escape"), false, false)).toMatchObject({ because: "leave" });
    expect(moveFor(press("5"), false, false)).toBe("native");
  });
});
