"use client";
import { Button, LinkButton, StatusWord, WellStrip } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { GridDesk } from "./grid-desk";
import { placeName } from "./hand-over";

interface GridCellLineProps {
  desk: GridDesk;
  cell: string | null;
}

/** The line above the sheet: the cell on which the cursor stands, its limits, and what is said about its value. */
export function GridCellLine({ desk, cell }: GridCellLineProps) {
  const row = cell === null ? undefined : desk.sheet.watch.get(cell);
  if (cell === null || !row) {
    return (
      <div className="desk-cell-line text-ink-3">
        {cell === null
          ? "Put the cursor on a cell and type."
          : "This is not read here. Setup says what is read where."}
      </div>
    );
  }
  const view = desk.view(cell);
  const { parameter, limits } = row;
  const bounds = limits.state === "in-force" ? limits.bounds : {};
  const value = view.verdict?.state === "judged" ? view.verdict.value.value : null;
  const isNumber = parameter.kind === "number" || parameter.kind === "count";
  const answers = parameter.choices.map((each) => each.label).join(", ");
  return (
    <div className="desk-cell-line">
      <b className="font-semibold">
        {placeName(row)}, {parameter.name}
      </b>
      {isNumber ? (
        <WellStrip
          name={parameter.name}
          unit={unitLabel(parameter.unit)}
          decimals={parameter.decimals}
          value={value}
          previous={row.recent.find((each) => each.value !== null && each.qualifier === "")?.value}
          {...(view.status ? { status: view.status } : {})}
          {...bounds}
          possibleLow={parameter.plausible.low}
          possibleHigh={parameter.plausible.high}
        />
      ) : (
        answers !== "" && <span className="text-sm text-ink-3">answers: {answers}</span>
      )}
      {view.status !== null && view.status !== "none" && (
        <StatusWord
          status={view.status}
          direction={view.side === "change" ? null : view.side}
          detail={view.ground || undefined}
        />
      )}
      {view.stage === "sent" && (
        <span className="ml-auto flex items-center gap-1">
          {view.readingId !== null && (
            <LinkButton href={`/readings/${view.readingId}`} variant="quiet" size="small">
              Correct…
            </LinkButton>
          )}
          <Button variant="quiet" size="small" onClick={() => desk.reopen(cell)}>
            Measure again
          </Button>
        </span>
      )}
    </div>
  );
}
