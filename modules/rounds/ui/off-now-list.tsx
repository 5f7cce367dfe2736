import Link from "next/link";
import { agoText, StatusWord } from "@/lib/ui";
import type { OffNow } from "../rules/off-now";
import { LineStrip, ReadingFigure } from "./reading-figure";
import { type Names, nameOf } from "./sheet-words";

export interface OffNowListProps {
  items: readonly OffNow[];
  names: Names;
  now: number;
  mayEnter: boolean;
}

/** What is off now, the gravest first: value, strip, why, since when, and the way to measure again. */
export function OffNowList({ items, names, now, mayEnter }: OffNowListProps) {
  return (
    <ul className="divide-y divide-rule border-t border-rule">
      {items.map((item) => (
        <OffItem key={item.newest.id} item={item} names={names} now={now} mayEnter={mayEnter} />
      ))}
    </ul>
  );
}

function OffItem({ item, names, now, mayEnter }: Omit<OffNowListProps, "items"> & { item: OffNow }) {
  const { row, newest, previous } = item;
  const { parameter, limits } = row;
  const reading = { ...newest, typedUnit: parameter.unit };
  return (
    <li className="grid gap-x-5 gap-y-1.5 py-3 sm:grid-cols-[minmax(0,1fr)_150px]">
      <div className="min-w-0">
        <p className="flex flex-wrap items-baseline gap-x-3">
          <Link href={`/systems/${row.systemCode}`} className="link inline-block min-h-6 font-semibold">
            {row.systemCode} {parameter.name}
          </Link>
          <span className="font-semibold">
            <ReadingFigure reading={reading} parameter={parameter} />
          </span>
          <StatusWord
            status={newest.status}
            direction={newest.side === "low" || newest.side === "high" ? newest.side : null}
          />
        </p>
        <p className="text-[0.9375rem] text-ink-2">{newest.sentence}</p>
        <p className="flex flex-wrap gap-x-4 text-sm text-ink-3">
          <span>
            {row.areaName}
            {row.isDefaultPoint ? "" : `, ${row.pointName.toLowerCase()}`} · {agoText(newest.takenAt, now)} by{" "}
            {nameOf(names, newest.takenBy)}
          </span>
          <Link href={`/readings/${newest.id}`} className="link inline-block min-h-6">
            this reading
          </Link>
          {mayEnter && (
            <Link href={`/systems/${row.systemCode}/entry`} className="link inline-block min-h-6">
              measure again
            </Link>
          )}
        </p>
      </div>
      <span className="self-center">
        <LineStrip
          value={newest.qualifier === "" ? newest.value : null}
          previous={previous?.value ?? null}
          status={newest.status}
          bounds={limits.state === "in-force" ? limits.bounds : undefined}
          parameter={parameter}
        />
      </span>
    </li>
  );
}
