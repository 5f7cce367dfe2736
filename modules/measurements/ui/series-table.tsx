"use client";
import { useState } from "react";
import { Button, type DataColumn, DataTable, EmptyState, StatusWord, TimeText } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { SeriesReading } from "../series-model";
import { ReadingFigure } from "./reading-figure";
import type { ChangeNames, SeriesControl } from "./series-chart-data";

interface SeriesTableProps {
  readings: readonly SeriesReading[];
  parameter: FacilityParameter;
  control: SeriesControl;
  people: ReadonlyMap<number, string>;
  names: ChangeNames;
  zone: string;
}

const PAGE = 100;

function columnsOf(
  { parameter, people, names, zone }: SeriesTableProps,
  beyond: ReadonlyMap<number, string>,
) {
  const unit = unitLabel(parameter.unit);
  const remarks = (reading: SeriesReading) =>
    [
      beyond.get(reading.id),
      reading.isCorrected ? "corrected" : null,
      reading.methodId === null ? null : names.methods.get(reading.methodId),
      reading.instrumentId === null ? null : names.instruments.get(reading.instrumentId),
      reading.note,
    ]
      .filter(Boolean)
      .join(" · ");
  const columns: DataColumn<SeriesReading>[] = [
    {
      id: "at",
      head: "Taken",
      rowHead: true,
      tight: true,
      cell: (row) => <TimeText at={row.at} zone={zone} />,
    },
    {
      id: "value",
      head: unit === "" ? "Value" : `Value (${unit})`,
      numeric: parameter.kind === "number" || parameter.kind === "count",
      cell: (row) => <ReadingFigure reading={row} parameter={parameter} withUnit={false} />,
    },
    {
      id: "status",
      head: "Status",
      tight: true,
      cell: ({ status, side }) => <StatusWord status={status} direction={side === "change" ? null : side} />,
    },
    { id: "by", head: "Taken by", wideOnly: true, cell: (row) => people.get(row.takenBy) ?? "" },
    { id: "remarks", head: "Method, instrument, remarks", wideOnly: true, cell: remarks },
  ];
  return columns;
}

/** The numbers behind the chart, newest first, a hundred at a time. */
export function SeriesTable(props: SeriesTableProps) {
  const { readings, control } = props;
  const [page, setPage] = useState(0);
  const pages = Math.max(1, Math.ceil(readings.length / PAGE));
  const shown = Math.min(page, pages - 1);
  const end = readings.length - shown * PAGE;
  const rows = readings.slice(Math.max(0, end - PAGE), end).reverse();
  const beyond = new Map(
    control.beyond.flatMap(({ index, side }) => {
      const reading = readings[index];
      return reading ? [[reading.id, `beyond the ${side} control limit`] as const] : [];
    }),
  );
  return (
    <>
      <DataTable
        caption="Readings of the chart, newest first"
        columns={columnsOf(props, beyond)}
        rows={rows}
        rowKey={(row) => row.id}
        maxHeight="70vh"
        rowStatus={({ status }) =>
          status === "watch" || status === "out" || status === "implausible" ? status : undefined
        }
        empty={
          <EmptyState title="No readings in this period">
            <p>Choose a longer period above, or enter readings at the system.</p>
          </EmptyState>
        }
      />
      {pages > 1 && (
        <nav aria-label="Pages of readings" className="flex flex-wrap items-center gap-3 pt-3">
          <Button size="small" disabled={shown === 0} onClick={() => setPage(shown - 1)}>
            Newer
          </Button>
          <span className="text-sm text-ink-2" aria-live="polite">
            Page {shown + 1} of {pages}, {readings.length.toLocaleString("en-GB")} readings
          </span>
          <Button size="small" disabled={shown === pages - 1} onClick={() => setPage(shown + 1)}>
            Older
          </Button>
        </nav>
      )}
    </>
  );
}
