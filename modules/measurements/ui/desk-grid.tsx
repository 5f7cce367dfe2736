"use client";
import dynamic from "next/dynamic";
import { useCallback, useEffect, useMemo, useRef, useState, useSyncExternalStore } from "react";
import { systemClock } from "@/lib/clock";
import { KeyHint, Skeleton, useLiveMessage } from "@/lib/ui";
import type { WatchRow } from "../model";
import { GridCellLine } from "./grid-cell-line";
import { GridDesk } from "./grid-desk";
import { layOutSheet } from "./grid-model";
import { GridPanel } from "./grid-panel";
import type { GridTable } from "./grid-table";
import { SendState } from "./send-state";
import { type PersonName, TakenFields, useTaken } from "./taken-fields";
import { useOutbox } from "./use-outbox";

/** The grid is heavy: it is fetched when a sheet is opened, not with every page. */
const GridSheet = dynamic(() => import("./grid-sheet").then((module) => module.GridSheet), {
  ssr: false,
  loading: () => <Skeleton lines={8} label="The sheet is being laid out" />,
});

export interface DeskGridProps {
  rows: readonly WatchRow[];
  people: readonly PersonName[];
  personId: number;
  zone: string;
}

/** The grid for a desk: a row per point, a column per parameter, typed by the keyboard alone or pasted as a block. */
export function DeskGrid({ rows, people, personId, zone }: DeskGridProps) {
  const { outbox, state } = useOutbox(personId);
  const taken = useTaken(zone);
  const desk = useMemo(() => {
    const how = { now: () => systemClock.now(), newUuid: () => crypto.randomUUID() };
    return new GridDesk(layOutSheet(rows), outbox, how);
  }, [rows, outbox]);
  useSyncExternalStore(desk.subscribe, desk.version, () => 0);
  useEffect(() => outbox.subscribe(desk.touch), [outbox, desk]);
  useEffect(() => desk.setTaken(taken.taken), [desk, taken.taken]);
  const tell = useLiveMessage();
  const say = useCallback((text: string) => tell({ text }), [tell]);
  const table = useRef<GridTable | null>(null);
  const setTable = useCallback((next: GridTable | null) => {
    table.current = next;
  }, []);
  const heading = useRef<HTMLHeadingElement>(null);
  const leave = useCallback(() => heading.current?.focus(), []);
  const [cell, setCell] = useState<string | null>(null);

  const goTo = (key: string) => {
    const [pointId, parameterId] = key.split(":").map(Number);
    const row = desk.sheet.rows.findIndex((each) => each.pointId === pointId);
    const column = desk.sheet.columns.findIndex((each) => each.parameterId === parameterId);
    table.current?.focus(row, column);
  };
  const waiting = desk.waiting();

  return (
    <div className="grid gap-3">
      <div className="flex flex-wrap items-start justify-between gap-3">
        <TakenFields taken={taken} people={people} personId={personId} />
        <SendState state={state} waiting={waiting.length} zone={zone} onRetry={outbox.retry} />
      </div>
      <div className="desk-layout">
        <div className="min-w-0">
          <GridCellLine desk={desk} cell={cell} />
          <GridSheet desk={desk} onCell={setCell} say={say} onLeave={leave} onTable={setTable} />
          <Hints />
        </div>
        <GridPanel
          desk={desk}
          waiting={waiting}
          block={desk.block()}
          onGoTo={goTo}
          onSendBlock={() => desk.sendBlock()}
          headingRef={heading}
        />
      </div>
    </div>
  );
}

const HINTS = [
  ["Enter", "hand over, down"],
  ["Enter again", "it really shows this"],
  ["Tab", "right"],
  ["Ctrl V", "paste a block"],
  ["Ctrl Enter", "send the block"],
  ["Ctrl Z / Ctrl Y", "undo, redo the unsent"],
  ["F2", "change"],
  ["Del", "empty"],
  ["Esc", "leave the sheet"],
] as const;

function Hints() {
  return (
    <p className="flex flex-wrap gap-x-4 gap-y-1.5 pt-3 text-sm text-ink-3">
      {HINTS.map(([key, what]) => (
        <span key={key} className="whitespace-nowrap">
          <KeyHint>{key}</KeyHint> {what}
        </span>
      ))}
      <span>
        Type <span className="num">13.4</span>, <span className="num">13,4</span>,{" "}
        <span className="num">&lt;0.05</span>, <span className="num">&gt;200</span> or{" "}
        <span className="num">ND</span>.
      </span>
    </p>
  );
}
