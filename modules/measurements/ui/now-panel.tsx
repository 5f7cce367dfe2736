import Link from "next/link";
import { EmptyState, Panel, StatusWord, TimeText, WellStrip } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { WatchRow } from "../model";
import { ReadingFigure } from "./reading-figure";

interface NowPanelProps {
  rows: readonly WatchRow[];
  /** The row whose chart stands beside: point and parameter. */
  shown: { readonly pointId: number; readonly parameterId: number } | null;
  hrefOf: (row: WatchRow) => string;
  people: ReadonlyMap<number, string>;
  zone: string;
  now: number;
}

const DAY_MS = 86_400_000;
/** Longer ago than this, the year is said too. */
const SAME_YEAR_MS = 300 * DAY_MS;

/** How everything that is read here stands now: the newest value of each on its well strip. */
export function NowPanel(props: NowPanelProps) {
  const { rows } = props;
  return (
    <Panel title="Now" id="now">
      {rows.length === 0 ? (
        <EmptyState title="Nothing is read here yet">
          <p>A lead says under Setup what is read at each point, how often, and with which instrument.</p>
        </EmptyState>
      ) : (
        <ul className="border-t border-rule sm:grid sm:grid-cols-[minmax(8rem,1fr)_auto_8.5rem_8.75rem] sm:gap-x-4">
          {rows.map((row) => (
            <NowRow key={`${row.pointId} ${row.parameter.id}`} row={row} {...props} />
          ))}
        </ul>
      )}
    </Panel>
  );
}

function NowRow({ row, shown, hrefOf, people, zone, now }: NowPanelProps & { row: WatchRow }) {
  const { parameter, recent } = row;
  const newest = recent[0];
  const isShown = shown?.pointId === row.pointId && shown.parameterId === parameter.id;
  const isNumber = parameter.kind === "number" || parameter.kind === "count";
  const tone = newest && { out: "text-out", implausible: "text-odd" }[newest.status as "out" | "implausible"];
  return (
    <li
      className={`grid grid-cols-[minmax(0,1fr)_auto] items-center gap-x-4 gap-y-1.5 border-b border-rule py-2.5 sm:col-span-4 sm:grid-cols-subgrid ${isShown ? "shadow-[inset_3px_0_0_var(--water)]" : ""} pl-2.5`}
    >
      <span className="min-w-0">
        <Link
          className="inline-flex min-h-6 items-center font-semibold text-ink underline decoration-edge decoration-1 underline-offset-4 hover:decoration-2"
          href={hrefOf(row)}
          scroll={false}
          aria-current={isShown ? "true" : undefined}
        >
          {row.isDefaultPoint ? parameter.name : `${parameter.name}, ${row.pointName.toLowerCase()}`}
        </Link>
      </span>
      <span className={`text-right text-[1.1875rem] font-semibold ${tone ?? ""}`}>
        {newest ? (
          <ReadingFigure reading={newest} parameter={parameter} />
        ) : (
          <span className="text-base font-normal text-ink-3">not read yet</span>
        )}
      </span>
      <span className="max-sm:col-start-1 max-sm:max-w-44">{isNumber && <NowStrip row={row} />}</span>
      <span className="flex flex-col items-start gap-y-0.5 text-[0.9375rem] max-sm:col-start-2 max-sm:items-end max-sm:text-right">
        {newest && (
          <>
            <StatusWord
              status={newest.status}
              direction={newest.side === "change" ? null : newest.side}
              quietWhenWithin
            />
            <span className="text-sm text-ink-3">
              <TimeText at={newest.takenAt} zone={zone} show={ageWords(now - newest.takenAt)} />{" "}
              {people.get(newest.takenBy) ?? ""}
            </span>
          </>
        )}
      </span>
    </li>
  );
}

function ageWords(ms: number): "time" | "weekday" | "day" {
  if (ms < DAY_MS) return "time";
  return ms < SAME_YEAR_MS ? "weekday" : "day";
}

function NowStrip({ row }: { row: WatchRow }) {
  const { parameter, limits, recent } = row;
  const [newest, before] = recent;
  const bounds = limits.state === "in-force" ? limits.bounds : {};
  return (
    <WellStrip
      fluid
      name={parameter.name}
      unit={unitLabel(parameter.unit)}
      decimals={parameter.decimals}
      value={newest?.value ?? null}
      previous={before?.value ?? null}
      {...(newest ? { status: newest.status } : {})}
      target={bounds.target}
      watchLow={bounds.watchLow}
      watchHigh={bounds.watchHigh}
      toleranceLow={bounds.toleranceLow}
      toleranceHigh={bounds.toleranceHigh}
      possibleLow={parameter.plausible.low}
      possibleHigh={parameter.plausible.high}
    />
  );
}
