"use client";
import { type ReactNode, useRef } from "react";
import type { WatchRow } from "../model";
import { EntryRow } from "./entry-row";
import { placeName } from "./hand-over";
import type { useEntry } from "./use-entry";

export interface EntryListProps {
  rows: readonly WatchRow[];
  entry: ReturnType<typeof useEntry>;
  now: number;
  zone: string;
  /** Enter in the last box. */
  onEnd?: () => void;
  /** Shown under a stored value that is off: a link to the incident it belongs to. */
  renderIncidentLink?: (readingId: number) => ReactNode;
}

/** What is to be read at one system, point by point in walking order; Enter hands a value over and goes on to the next box. */
export function EntryList({ rows, entry, now, zone, onEnd, renderIncidentLink }: EntryListProps) {
  const list = useRef<HTMLDivElement>(null);
  const points = [...new Map(rows.map((row) => [row.pointId, row])).values()].sort(
    (a, b) => Number(b.isDefaultPoint) - Number(a.isDefaultPoint),
  );

  const goOn = (from: HTMLElement) => {
    const cell = from.closest("[data-cell]")?.getAttribute("data-cell");
    // the box that was just handed over is still there until React has drawn anew
    requestAnimationFrame(() => {
      const all = [...(list.current?.querySelectorAll<HTMLElement>("[data-cell]") ?? [])];
      const at = all.findIndex((each) => each.dataset.cell === cell);
      const next = all
        .slice(at + 1)
        .flatMap((each) => each.querySelector<HTMLElement>("[data-entry]") ?? [])[0];
      if (!next) return onEnd?.();
      next.focus();
      next.closest("[data-cell]")?.scrollIntoView({ block: "nearest" });
    });
  };

  return (
    <div ref={list} className="grid gap-6">
      {points.map((point) => (
        <section key={point.pointId} aria-label={placeName(point)}>
          {(points.length > 1 || !point.isDefaultPoint) && (
            <h2 className="border-b border-edge pb-1.5">{point.pointName}</h2>
          )}
          <ul>
            {rows
              .filter((row) => row.pointId === point.pointId)
              .map((row) => (
                <EntryRow
                  key={row.parameter.id}
                  entry={entry.cellOf(row)}
                  place={placeName(row)}
                  now={now}
                  zone={zone}
                  onEnter={goOn}
                  renderIncidentLink={renderIncidentLink}
                />
              ))}
          </ul>
        </section>
      ))}
    </div>
  );
}
