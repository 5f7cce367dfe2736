"use client";
import type { Ref } from "react";
import { Button, StatusWord } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { WatchRow } from "../model";
import type { GridDesk } from "./grid-desk";
import type { CellView } from "./grid-view";
import { placeName } from "./hand-over";
import { applySlip, slipLabel } from "./judge-typed";

interface GridPanelProps {
  desk: GridDesk;
  waiting: readonly CellView[];
  block: { size: number; unready: number };
  onGoTo: (key: string) => void;
  onSendBlock: () => void;
  headingRef: Ref<HTMLHeadingElement>;
}

/** What waits for the person: each with its sentence, what may have been meant, and the way to confirm. */
export function GridPanel({ desk, waiting, block, onGoTo, onSendBlock, headingRef }: GridPanelProps) {
  return (
    <section aria-labelledby="grid-waits" className="min-w-0">
      <h2 id="grid-waits" ref={headingRef} tabIndex={-1} className="border-b border-edge pb-1.5">
        Waits for you
      </h2>
      {block.size > 0 && (
        <div className="border-b border-rule py-3">
          <p>
            <b className="font-semibold">{block.size} pasted, not sent.</b>{" "}
            {block.unready > 0
              ? `${block.unready} of them must be mended or confirmed first; then all go together.`
              : "All can be read. Look them over, then send them."}
          </p>
          <span className="mt-2 flex flex-wrap gap-2">
            <Button variant="next" disabled={block.unready > 0} onClick={onSendBlock}>
              Send {block.size} pasted
            </Button>
            <Button variant="quiet" onClick={() => desk.undo()}>
              Undo the last step
            </Button>
          </span>
        </div>
      )}
      {waiting.length === 0 && block.size === 0 && (
        <p className="py-3 text-ink-3">
          Nothing. What is out of tolerance or implausible waits here until you have looked again.
        </p>
      )}
      <ul>
        {waiting.map((view) => {
          const row = desk.sheet.watch.get(view.key);
          return row && <WaitingCell key={view.key} desk={desk} view={view} row={row} onGoTo={onGoTo} />;
        })}
      </ul>
    </section>
  );
}

interface WaitingCellProps {
  desk: GridDesk;
  view: CellView;
  row: WatchRow;
  onGoTo: (key: string) => void;
}

function WaitingCell({ desk, view, row, onGoTo }: WaitingCellProps) {
  const { key, text, unit, status, side, verdict, sentence, need } = view;
  const typed = { text, unit, takenAt: 0 };
  const slips = verdict?.state === "judged" ? verdict.slips : [];
  const what = `${placeName(row)}, ${row.parameter.name}`;
  return (
    <li className="border-b border-rule py-3">
      <p className="flex flex-wrap items-baseline gap-x-2">
        <button type="button" className="link min-h-6 text-left font-semibold" onClick={() => onGoTo(key)}>
          {what}
        </button>
        <span className="num">
          {text}
          <span className="unit">{unitLabel(unit)}</span>
        </span>
      </p>
      {status !== null && status !== "within" && status !== "none" && (
        <StatusWord status={status} direction={side === "change" ? null : side} />
      )}
      <p className="text-sm text-ink-2">{sentence}</p>
      <span className="mt-2 flex flex-wrap gap-2">
        {slips.map((slip) => {
          const meant = applySlip(typed, slip);
          return (
            <Button
              key={slipLabel(typed, slip)}
              size="small"
              title={slip.sentence}
              aria-label={`${what}: ${slip.sentence} Use ${slipLabel(typed, slip).replace("?", "")}`}
              onClick={() => desk.type(key, meant.text, meant.unit)}
            >
              {slipLabel(typed, slip)}
            </Button>
          );
        })}
        {need === "confirm" && (
          <Button size="small" aria-label={`${what} really shows ${text}`} onClick={() => desk.confirm(key)}>
            It really shows this
          </Button>
        )}
        {view.stage === "draft" && (
          <Button size="small" variant="quiet" aria-label={`Empty ${what}`} onClick={() => desk.clear(key)}>
            Empty
          </Button>
        )}
      </span>
    </li>
  );
}
