import Link from "next/link";
import { type DataColumn, DataTable, EmptyState, Pager, Panel, StatusWord, TimeText } from "@/lib/ui";
import type { FacilityParameter } from "@/modules/methods/model";
import type { Qualifier, Side, Status } from "../model";
import { ReadingFigure } from "./reading-figure";

interface ListedReading {
  readonly id: number;
  readonly parameterId: number;
  readonly takenAt: number;
  readonly takenBy: number;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly typedText: string;
  readonly status: Status;
  readonly side: Side | null;
  readonly note: string | null;
  readonly supersedesId: number | null;
  readonly place: { readonly pointName: string; readonly isDefaultPoint: number | boolean };
}

interface RecentReadingsProps {
  readings: readonly ListedReading[];
  parameters: readonly FacilityParameter[];
  people: ReadonlyMap<number, string>;
  zone: string;
  /** Where the newest readings stand; null on that very page. */
  newestHref: string | null;
  olderHref: string | null;
}

/** A system's readings, newest first; each leads to its own page. */
export function RecentReadings(props: RecentReadingsProps) {
  const { readings, parameters, people, zone, newestHref, olderHref } = props;
  const byId = new Map(parameters.map((each) => [each.id, each]));
  const columns: DataColumn<ListedReading>[] = [
    {
      id: "what",
      head: "Reading",
      rowHead: true,
      cell: (row) => (
        <Link className="link inline-flex min-h-6 items-center" href={`/readings/${row.id}`}>
          {byId.get(row.parameterId)?.name ?? `parameter ${row.parameterId}`}
          {!row.place.isDefaultPoint && `, ${row.place.pointName.toLowerCase()}`}
        </Link>
      ),
    },
    {
      id: "value",
      head: "Value",
      numeric: true,
      cell: (row) => {
        const parameter = byId.get(row.parameterId);
        return parameter ? <ReadingFigure reading={row} parameter={parameter} /> : row.typedText;
      },
    },
    {
      id: "status",
      head: "Status",
      tight: true,
      cell: ({ status, side }) => <StatusWord status={status} direction={side === "change" ? null : side} />,
    },
    {
      id: "at",
      head: "Taken",
      tight: true,
      wideOnly: true,
      cell: (row) => <TimeText at={row.takenAt} zone={zone} />,
    },
    { id: "by", head: "By", wideOnly: true, cell: (row) => people.get(row.takenBy) ?? "" },
    {
      id: "note",
      head: "Remarks",
      wideOnly: true,
      cell: (row) => [row.supersedesId === null ? null : "corrected", row.note].filter(Boolean).join(" · "),
    },
  ];
  return (
    <Panel title="Recent readings" id="readings">
      <DataTable
        caption="Recent readings, newest first"
        columns={columns}
        rows={readings}
        rowKey={(row) => row.id}
        rowStatus={({ status }) =>
          status === "watch" || status === "out" || status === "implausible" ? status : undefined
        }
        empty={
          <EmptyState title="No readings yet">
            <p>Readings entered, imported or derived for this system will stand here, newest first.</p>
          </EmptyState>
        }
      />
      <Pager newerHref={newestHref} newerText="Newest" olderHref={olderHref} />
    </Panel>
  );
}
