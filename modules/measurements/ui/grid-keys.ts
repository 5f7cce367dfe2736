export type GridMove = "up" | "down" | "left" | "right";

/** What a key asks of the sheet. */
export type GridAct = {
  readonly because: "enter" | "tab" | "arrow" | "clear" | "undo" | "redo" | "send-block" | "leave";
  readonly move: GridMove;
};

type Keys = Pick<KeyboardEvent, "key" | "shiftKey" | "ctrlKey" | "metaKey" | "altKey">;

const ARROWS: Readonly<Record<string, GridMove>> = {
  ArrowUp: "up",
  ArrowDown: "down",
  ArrowLeft: "left",
  ArrowRight: "right",
};

/**
 * What does a key mean on the sheet? An act of ours; "native": the grid or the text box does what it always does;
 * "cancel": what is typed is dropped; null: nothing of ours (while editing, the grid is not told either).
 * Type over a cell and the arrows leave it, as on any sheet; open it by F2 and they move in the text.
 */
export function moveFor(
  event: Keys,
  editing: boolean,
  typedOver: boolean,
): GridAct | "native" | "cancel" | null {
  const { key, shiftKey } = event;
  const command = event.ctrlKey || event.metaKey;
  if (command && !event.altKey) {
    const letter = key.toLowerCase();
    if (editing) return null;
    if (letter === "z") return { because: shiftKey ? "redo" : "undo", move: "down" };
    if (letter === "y") return { because: "redo", move: "down" };
    if (key === "Enter") return { because: "send-block", move: "down" };
    return "native";
  }
  if (key === "Enter") return { because: "enter", move: shiftKey ? "up" : "down" };
  if (key === "Tab") return { because: "tab", move: shiftKey ? "left" : "right" };
  if (key === "Escape") return editing ? "cancel" : { because: "leave", move: "down" };
  const arrow = ARROWS[key];
  if (arrow) {
    if (!editing) return { because: "arrow", move: arrow };
    return typedOver || arrow === "up" || arrow === "down" ? { because: "arrow", move: arrow } : null;
  }
  if (!editing && (key === "Delete" || key === "Backspace")) return { because: "clear", move: "down" };
  return editing ? null : "native";
}
