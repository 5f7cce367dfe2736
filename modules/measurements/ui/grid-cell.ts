import { numberText, STATUS_WORDS } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { WatchRow } from "../model";
import type { GridDesk } from "./grid-desk";
import type { CellView } from "./grid-view";

const STAGE_WORDS: Readonly<Record<CellView["stage"], string>> = {
  empty: "",
  draft: "",
  queued: "sending",
  sending: "sending",
  waiting: "not sent yet",
  sent: "sent",
  refused: "not stored",
};

/** What stands under the value: its status where it is not within, then what is to be done or how the sending goes. */
export function cellWords(view: CellView): string {
  const parts: string[] = [];
  const { status, ground, need, stage } = view;
  if (status !== null && status !== "within" && status !== "none") {
    parts.push(ground === "" ? STATUS_WORDS[status] : `${STATUS_WORDS[status]}, ${ground}`);
  }
  if (need === "confirm") parts.push("Enter: it shows this");
  else if (need === "mend" && stage === "draft") parts.push("cannot be used");
  else if (need === "block") parts.push("pasted");
  else if (STAGE_WORDS[stage] !== "") parts.push(STAGE_WORDS[stage]);
  return parts.join(" · ");
}

/** The same in the little room under a value: the status, and a sign for what is due (↵) or done (✓); the words say it in full. */
function shortWords(view: CellView): string {
  const { status, need, stage } = view;
  if (status === null || status === "within" || status === "none") return cellWords(view);
  const sign =
    need === "confirm" ? " ↵" : stage === "sent" ? " ✓" : need === "block" ? "" : ` ${STAGE_WORDS[stage]}`;
  return `${STATUS_WORDS[status]}${sign}`.trim();
}

/** A signature of all that is painted, to see whether a cell must be painted anew. */
export function cellSignature(view: CellView): string {
  const { text, unit, status, side, stage, need, ground, isOpen } = view;
  return JSON.stringify([text, unit, status, side, stage, need, ground, isOpen]);
}

function part(className: string, text: string): HTMLElement {
  const element = document.createElement("span");
  element.className = className;
  element.textContent = text;
  return element;
}

/** How a text is shown: the label of an answer; anything else as typed. */
function shownText(view: CellView, watched: WatchRow | undefined): string {
  const choice = watched?.parameter.choices.find((each) => each.code === view.text);
  return choice?.label ?? view.text;
}

/**
 * Paints a cell: the value with its unit where that is not the header's, a shape for its status, and the words.
 * Plain DOM, so that it stands in the same frame as the key press.
 */
export function paintCell(desk: GridDesk, view: CellView, headerUnit: string | null): HTMLElement {
  const box = document.createElement("div");
  box.className = "desk-cell";
  box.dataset.stage = view.stage;
  if (!view.isRead) {
    box.append(part("desk-void", "·"), part("sr-only", "not read here"));
    return box;
  }
  if (view.status !== null) box.dataset.status = view.status;
  if (view.need !== null) box.dataset.need = view.need;
  const line = part("desk-line", "");
  if (view.text === "") {
    const last = desk.lastValue(view.key);
    box.append(part("sr-only", "empty"));
    if (last) {
      line.append(part("sr-only", ", last "), part("desk-last", numberText(last.value, last.decimals)));
      box.append(line);
    }
    return box;
  }
  const shape = part("desk-shape", "");
  shape.dataset.side = view.side ?? "";
  shape.ariaHidden = "true";
  line.append(shape, part("desk-value", shownText(view, desk.sheet.watch.get(view.key))));
  if (view.unit !== headerUnit && view.unit !== null) line.append(part("desk-unit", unitLabel(view.unit)));
  const words = cellWords(view);
  const said = view.status === "within" && words !== "" ? `within, ${words}` : words;
  box.append(line, part("sr-only", `, ${said}`));
  const shown = part("desk-words", shortWords(view));
  shown.ariaHidden = "true";
  shown.title = words;
  box.append(shown);
  return box;
}
