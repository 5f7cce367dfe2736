import Link from "next/link";
import { type DataColumn, DataTable, EmptyState, Panel, Quantity, StatusWord } from "@/lib/ui";
import type { WatchRow } from "../model";
import type { SeriesSummary } from "../series-model";
import { ReadingFigure } from "./reading-figure";

interface ChartChooserProps {
  rows: readonly WatchRow[];
  summaries: readonly SeriesSummary[];
  days: number;
  /** Codes of points by id, for addresses. */
  pointCodes: ReadonlyMap<number, string>;
  /** Under the area's name; one heading less where all is of one system. */
  ofOneSystem?: boolean;
}

type Line = WatchRow & { readonly summary: SeriesSummary | null; readonly href: string };

const columns = (days: number): DataColumn<Line>[] => [
  {
    id: "parameter",
    head: "Parameter",
    rowHead: true,
    cell: (line) => (
      <Link className="link inline-flex min-h-6 items-center" href={line.href}>
        {line.parameter.name}
        {!line.isDefaultPoint && `, ${line.pointName.toLowerCase()}`}
        <span className="sr-only"> of {line.systemCode}</span>
      </Link>
    ),
  },
  {
    id: "newest",
    head: "Newest",
    numeric: true,
    cell: ({ recent: [newest], parameter }) =>
      newest ? <ReadingFigure reading={newest} parameter={parameter} /> : "–",
  },
  {
    id: "status",
    head: "Status",
    tight: true,
    wideOnly: true,
    cell: ({ recent: [newest] }) =>
      newest && (
        <StatusWord status={newest.status} direction={newest.side === "change" ? null : newest.side} />
      ),
  },
  {
    id: "within",
    head: `In tolerance, ${days} days`,
    numeric: true,
    cell: ({ summary }) => (
      <Quantity
        value={summary?.within == null ? null : 100 * floored(summary.within)}
        decimals={1}
        unit="%"
      />
    ),
  },
  {
    id: "out",
    head: "Readings out",
    numeric: true,
    cell: ({ summary }) => (summary ? `${summary.out} of ${summary.readings}` : "–"),
  },
];

function Chevron() {
  return (
    <svg
      width="10"
      height="10"
      viewBox="0 0 10 10"
      aria-hidden="true"
      className="flex-none fill-none stroke-ink-3 group-open:rotate-90"
    >
      <path d="M3 1L7 5L3 9" strokeWidth="1.6" />
    </svg>
  );
}

/** How often something was out of tolerance here of late. */
function outWords(lines: readonly Line[], days: number): string {
  const out = lines.reduce((sum, line) => sum + (line.summary?.out ?? 0), 0);
  if (out === 0) return `none out in ${days} days`;
  return `${out.toLocaleString("en-GB")} ${out === 1 ? "reading" : "readings"} out in ${days} days`;
}

/** Never 100.0 % where something was out. */
const floored = (share: number): number => Math.floor(share * 1000 + 1e-9) / 1000;

/** What can be charted, by area and system in walking order, each with how it did of late. */
export function ChartChooser({ rows, summaries, days, pointCodes, ofOneSystem = false }: ChartChooserProps) {
  const bySeries = new Map(summaries.map((each) => [`${each.pointId} ${each.parameterId}`, each]));
  const lines = rows.map((row): Line => {
    const point = row.isDefaultPoint ? "" : `?point=${encodeURIComponent(pointCodes.get(row.pointId) ?? "")}`;
    return {
      ...row,
      summary: bySeries.get(`${row.pointId} ${row.parameter.id}`) ?? null,
      href: `/systems/${row.systemCode}/charts/${row.parameter.code}${point}`,
    };
  });
  if (lines.length === 0) {
    return (
      <EmptyState title="Nothing to chart yet">
        <p>
          A chart comes with every parameter that is read at a point. A lead says under Setup what is read
          where.
        </p>
      </EmptyState>
    );
  }
  const table = (of: readonly Line[], caption: string) => (
    <DataTable
      caption={caption}
      columns={columns(days)}
      rows={of}
      rowKey={(line) => `${line.pointId} ${line.parameter.id}`}
      rowStatus={({ recent: [newest] }) =>
        newest?.status === "out" || newest?.status === "watch" || newest?.status === "implausible"
          ? newest.status
          : undefined
      }
    />
  );
  if (ofOneSystem) return <Panel>{table(lines, "Charts of this system")}</Panel>;
  const areas = [...new Map(lines.map((line) => [line.areaId, line.areaName]))];
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
      {areas.map(([areaId, areaName]) => {
        const ofArea = lines.filter((line) => line.areaId === areaId);
        const systems = [...new Map(ofArea.map((line) => [line.systemId, line]))];
        return (
          <Panel key={areaId} title={areaName} id={`area-${areaId}`}>
            <div className="grid grid-cols-[minmax(0,1fr)] gap-1.5">
              {systems.map(([systemId, first]) => {
                const ofSystem = ofArea.filter((line) => line.systemId === systemId);
                const out = ofSystem.filter((line) => line.recent[0]?.status === "out").length;
                return (
                  <details
                    key={systemId}
                    className="group border-t border-rule pt-1.5"
                    open={out > 0 || systems.length === 1}
                  >
                    <summary className="flex min-h-11 flex-wrap items-center gap-x-3">
                      <Chevron />
                      <h3>{first.systemCode}</h3>
                      <span className="text-ink-2">{first.systemName}</span>
                      <span className="ml-auto text-sm text-ink-3">
                        {ofSystem.length === 1 ? "1 chart" : `${ofSystem.length} charts`},{" "}
                        {outWords(ofSystem, days)}
                      </span>
                      {out > 0 && <StatusWord status="out" detail={`${out} now`} />}
                    </summary>
                    {table(ofSystem, `Charts of ${first.systemCode}`)}
                  </details>
                );
              })}
            </div>
          </Panel>
        );
      })}
    </div>
  );
}
