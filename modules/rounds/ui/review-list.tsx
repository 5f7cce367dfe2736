"use client";
import Link from "next/link";
import { useState } from "react";
import { Button, ButtonRow, Checkbox, DataTable } from "@/lib/ui";
import { SHEET_STATE_WORDS, type SheetCounts, type SheetState } from "../model";
import { countWords, hasDeviations, readingsWord, weekdayWords } from "./sheet-words";
import { SignDialog } from "./sign-dialog";

/** A sheet in the lead's list. */
export interface ReviewRow {
  areaId: number;
  areaCode: string;
  areaName: string;
  onDay: string;
  isOver: boolean;
  contentHash: string;
  counts: SheetCounts;
  state: SheetState;
  comment: string | null;
  hindrances: string[];
}

const keyOf = (row: ReviewRow): string => `${row.areaCode}/${row.onDay}`;
const maySign = (row: ReviewRow): boolean =>
  row.hindrances.length === 0 && row.isOver && row.state !== "returned";

/** Sheets that wait, to be ticked and signed in one act. */
export function ReviewList({ rows, mayReview }: { rows: readonly ReviewRow[]; mayReview: boolean }) {
  const [ticked, setTicked] = useState<ReadonlySet<string>>(new Set());
  const [signing, setSigning] = useState(false);
  const chosen = rows.filter((row) => ticked.has(keyOf(row)) && maySign(row));
  const calm = rows.filter((row) => maySign(row) && !hasDeviations(row.counts));
  const tick = (row: ReviewRow, on: boolean) => {
    const next = new Set(ticked);
    if (on) next.add(keyOf(row));
    else next.delete(keyOf(row));
    setTicked(next);
  };
  return (
    <div className="grid gap-4">
      <DataTable
        caption="Day sheets that wait"
        rows={rows}
        rowKey={keyOf}
        rowStatus={({ counts }) =>
          counts.out > 0
            ? "out"
            : counts.implausible > 0
              ? "implausible"
              : counts.watch > 0
                ? "watch"
                : undefined
        }
        columns={[
          ...(mayReview
            ? [
                {
                  id: "tick",
                  head: <span className="sr-only">Sign</span>,
                  cell: (row: ReviewRow) => <Tick row={row} on={ticked.has(keyOf(row))} onTick={tick} />,
                },
              ]
            : []),
          {
            id: "sheet",
            head: "Day and area",
            rowHead: true,
            cell: (row) => (
              <Link href={`/rounds/${row.areaCode}/${row.onDay}`} className="link inline-block min-h-6">
                {weekdayWords(row.onDay)}, {row.areaName}
              </Link>
            ),
          },
          {
            id: "count",
            head: "Readings",
            numeric: true,
            wideOnly: true,
            cell: (row) => row.counts.readings,
          },
          {
            id: "found",
            head: "What deviates",
            cell: (row) => (
              <>
                <Found row={row} />
                <span className="block sm:hidden">
                  <StateWords row={row} />
                </span>
              </>
            ),
          },
          { id: "state", head: "State", wideOnly: true, cell: (row) => <StateWords row={row} /> },
        ]}
      />
      {mayReview && (
        <ButtonRow>
          <Button variant="next" disabled={chosen.length === 0} onClick={() => setSigning(true)}>
            {chosen.length === 0
              ? "Sign the ticked sheets…"
              : `Sign ${sheetsWord(chosen.length)} as reviewed…`}
          </Button>
          <Button disabled={calm.length === 0} onClick={() => setTicked(new Set(calm.map(keyOf)))}>
            Tick those without deviations ({calm.length})
          </Button>
        </ButtonRow>
      )}
      {signing && (
        <SignDialog
          outcome="reviewed"
          sheets={chosen.map(({ areaId, onDay, contentHash }) => ({ areaId, onDay, contentHash }))}
          onClose={() => setSigning(false)}
          onDone={() => setTicked(new Set())}
        >
          <p>{sheetsWord(chosen.length)} in one act:</p>
          <ul>
            {chosen.map((row) => (
              <li key={keyOf(row)}>
                {weekdayWords(row.onDay)}, {row.areaName}: {readingsWord(row.counts.readings)}
                {hasDeviations(row.counts) ? `; ${countWords(row.counts).join(", ")}` : ", nothing deviates"}
              </li>
            ))}
          </ul>
        </SignDialog>
      )}
    </div>
  );
}

const sheetsWord = (count: number): string => `${count} ${count === 1 ? "sheet" : "sheets"}`;

function Tick({
  row,
  on,
  onTick,
}: {
  row: ReviewRow;
  on: boolean;
  onTick: (row: ReviewRow, on: boolean) => void;
}) {
  if (!maySign(row)) return null;
  const label = `Sign ${weekdayWords(row.onDay)}, ${row.areaName}`;
  return (
    <Checkbox
      label={<span className="sr-only">{label}</span>}
      checked={on}
      onChange={(event) => onTick(row, event.target.checked)}
    />
  );
}

function Found({ row }: { row: ReviewRow }) {
  const words = countWords(row.counts);
  if (words.length === 0) return <span className="text-ink-3">nothing</span>;
  return <span className={row.counts.out > 0 ? "font-semibold" : ""}>{words.join(", ")}</span>;
}

function StateWords({ row }: { row: ReviewRow }) {
  return (
    <span className="text-sm text-ink-2">
      {row.isOver || row.state !== "waiting" ? SHEET_STATE_WORDS[row.state] : "the day is not over"}
      {row.state === "returned" && row.comment !== null && <span className="block">“{row.comment}”</span>}
      {row.hindrances.length > 0 && row.state !== "returned" && (
        <span className="block">
          {row.hindrances[0]}
          {row.hindrances.length > 1 && ` And ${row.hindrances.length - 1} more.`}
        </span>
      )}
    </span>
  );
}
