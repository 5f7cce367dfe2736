"use client";
import { useState } from "react";
import { Button, type DataColumn, DataTable, EmptyState, LinkButton, WellStrip } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { LimitBoardRow } from "../model";
import { LimitVersionsDialog } from "./limit-versions-dialog";
import { boundsWords } from "./limit-words";

export interface LimitBoardProps {
  systemCode: string;
  rows: LimitBoardRow[];
  parameters: FacilityParameter[];
  names: Readonly<Record<number, string>>;
  zone: string;
}

type Shown = { row: LimitBoardRow; parameter: FacilityParameter };

/** The limits in force at the points of a system, with the versions behind each. */
export function LimitBoard({ systemCode, rows, parameters, names, zone }: LimitBoardProps) {
  const [open, setOpen] = useState<Shown | null>(null);
  const shown = rows.flatMap((row): Shown[] => {
    const parameter = parameters.find((each) => each.id === row.parameterId);
    const isMeasured = parameter?.kind === "number" || parameter?.kind === "count";
    return parameter && (isMeasured || row.versions.length > 0) ? [{ row, parameter }] : [];
  });
  return (
    <>
      <DataTable
        caption={`Limits in force at the points of ${systemCode}`}
        rows={shown}
        rowKey={({ row }) => `${row.pointId} ${row.parameterId}`}
        columns={columns(setOpen)}
        empty={
          <EmptyState
            title="Nothing to limit yet"
            actions={
              <LinkButton href={`/setup/watch?system=${systemCode}`}>Say what is read here</LinkButton>
            }
          >
            Limits hang on a point and a parameter. Say first what is read at the points of {systemCode}; each
            measured parameter then stands here.
          </EmptyState>
        }
      />
      {open && <LimitVersionsDialog {...open} names={names} zone={zone} onClose={() => setOpen(null)} />}
    </>
  );
}

const columns = (open: (shown: Shown) => void): DataColumn<Shown>[] => [
  {
    id: "what",
    head: "Point, parameter",
    rowHead: true,
    cell: ({ row, parameter }) => (
      <>
        {parameter.name}
        {parameter.unit !== null && unitLabel(parameter.unit) !== "" && (
          <span className="unit">{unitLabel(parameter.unit)}</span>
        )}
        <span className="block text-sm font-normal text-ink-3">{row.pointName}</span>
      </>
    ),
  },
  { id: "strip", head: "Strip", wideOnly: true, cell: (shown) => <Strip {...shown} /> },
  { id: "limits", head: "In force now", cell: (shown) => <Now {...shown} /> },
  {
    id: "versions",
    head: <span className="sr-only">Versions</span>,
    tight: true,
    cell: (shown) => {
      const { row, parameter } = shown;
      const waits = row.versions.some((version) => version.state === "proposed");
      return (
        <span className="flex flex-wrap items-center justify-end gap-2">
          {waits && <span className="text-sm font-semibold">a change waits</span>}
          <Button
            size="small"
            aria-label={`Versions of the limits of ${parameter.name} at ${row.pointName}`}
            onClick={() => open(shown)}
          >
            {row.versions.length === 1 ? "1 version" : `${row.versions.length} versions`}
          </Button>
        </span>
      );
    },
  },
];

function Now({ row: { limits }, parameter }: Shown) {
  if (limits.state === "none") return <span className="text-ink-3">no limits</span>;
  if (limits.state === "suspended") return <>no limits: {limits.reason}</>;
  return <>{boundsWords(limits.bounds, parameter.decimals).join(" · ")}</>;
}

function Strip({ row: { limits, latest }, parameter }: Shown) {
  if (limits.state !== "in-force") return null;
  const { greatestChange24h: _change, ...bounds } = limits.bounds;
  return (
    <WellStrip
      name={parameter.name}
      unit={unitLabel(parameter.unit)}
      decimals={parameter.decimals}
      possibleLow={parameter.plausible.low}
      possibleHigh={parameter.plausible.high}
      {...bounds}
      value={latest?.value ?? null}
      status={latest?.status}
    />
  );
}
