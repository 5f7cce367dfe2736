"use client";
import Link from "next/link";
import { type ReactNode, useState } from "react";
import { type DataColumn, DataTable, EmptyState, PageHead, Panel, TextInput } from "@/lib/ui";
import {
  type Measured,
  SYSTEM_KIND_WORDS,
  SYSTEM_STATE_WORDS,
  type SystemRow,
  type VolumeUnit,
  WATER_TYPE_WORDS,
} from "../model";
import { VolumeQuantity } from "./volume-quantity";

/** A system in the list, with what the page knows of its readings. */
export interface ListedSystem extends SystemRow {
  readonly operating: Measured | null;
  /** What is off now, in words and shapes; null where nothing is. */
  readonly off: ReactNode;
  readonly worst: "watch" | "out" | "implausible" | null;
  readonly newest: ReactNode;
}

interface SystemsListProps {
  systems: readonly ListedSystem[];
  volumeUnit: VolumeUnit;
  actions?: ReactNode;
}

const columns = (unit: VolumeUnit): DataColumn<ListedSystem>[] => [
  {
    id: "code",
    head: "System",
    rowHead: true,
    cell: (system) => (
      <Link
        className="link inline-flex min-h-6 items-center whitespace-nowrap"
        href={`/systems/${system.code}`}
      >
        {system.code}
      </Link>
    ),
  },
  { id: "name", head: "Name", cell: (system) => system.name },
  {
    id: "kind",
    head: "Kind, water",
    wideOnly: true,
    cell: ({ kind, waterType, state }) => (
      <>
        {SYSTEM_KIND_WORDS[kind]}, {WATER_TYPE_WORDS[waterType]}
        {state !== "in-service" && <b className="block font-semibold">{SYSTEM_STATE_WORDS[state]}</b>}
      </>
    ),
  },
  {
    id: "volume",
    head: "Holds today",
    numeric: true,
    wideOnly: true,
    cell: (system) => <VolumeQuantity volumeL={system.operating} unit={unit} short />,
  },
  { id: "off", head: "Off now", cell: (system) => system.off ?? <span className="text-ink-3">nothing</span> },
  { id: "newest", head: "Newest reading", tight: true, wideOnly: true, cell: (system) => system.newest },
];

const includes = (system: ListedSystem, wanted: string): boolean =>
  [
    system.code,
    system.name,
    system.areaName,
    SYSTEM_KIND_WORDS[system.kind],
    WATER_TYPE_WORDS[system.waterType],
    SYSTEM_STATE_WORDS[system.state],
  ].some((text) => text.toLowerCase().includes(wanted));

/** Every system by area, in walking order: what it is, what it holds, and what is off. */
export function SystemsList({ systems, volumeUnit, actions }: SystemsListProps) {
  const [search, setSearch] = useState("");
  const words = search.trim().toLowerCase().split(/\s+/);
  const found = systems.filter((system) => words.every((word) => includes(system, word)));
  const areas = [...new Map(found.map((system) => [system.areaId, system.areaName]))];
  const off = systems.filter((system) => system.worst === "out" || system.worst === "implausible").length;
  return (
    <>
      <PageHead
        title="Systems"
        facts={`${systems.length === 1 ? "1 system" : `${systems.length} systems`}, ${off === 0 ? "none out of tolerance" : `${off} out of tolerance`}`}
        actions={actions}
      />
      {systems.length === 0 ? (
        <EmptyState title="No systems yet">
          <p>
            A system is one body of water with its own life support. An administrator or a lead adds them
            under <Link href="/setup/systems">Setup, Systems</Link>.
          </p>
        </EmptyState>
      ) : (
        <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
          <label className="block max-w-md">
            <span className="mb-1 block font-semibold">Search</span>
            <TextInput
              type="search"
              placeholder="code, name, area, kind or water"
              value={search}
              onChange={(event) => setSearch(event.currentTarget.value)}
            />
          </label>
          <p role="status" className="sr-only">
            {found.length} found
          </p>
          {found.length === 0 && (
            <p className="text-ink-2">No system fits “{search.trim()}”. Try fewer letters.</p>
          )}
          {areas.map(([areaId, areaName]) => (
            <Panel key={areaId} title={areaName} id={`area-${areaId}`}>
              <DataTable
                className="md:[&_table]:table-fixed"
                caption={`Systems of ${areaName} in walking order`}
                columns={columns(volumeUnit)}
                rows={found.filter((system) => system.areaId === areaId)}
                rowKey={(system) => system.id}
                rowStatus={(system) => system.worst ?? undefined}
              />
            </Panel>
          ))}
        </div>
      )}
    </>
  );
}
