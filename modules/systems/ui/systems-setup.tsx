"use client";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, type DataColumn, DataTable, EmptyState, PageHead, Quantity, useDone } from "@/lib/ui";
import { convertByFactor } from "@/lib/units/factors";
import {
  type AreaRow,
  SYSTEM_KIND_WORDS,
  SYSTEM_STATE_WORDS,
  type SystemRow,
  type VolumeUnit,
  WATER_TYPE_WORDS,
} from "../model";
import { SystemForm } from "./system-form";
import { plainVolume } from "./volume-text";

type SystemsSetupProps = {
  systems: SystemRow[];
  areas: AreaRow[];
  mayManage: boolean;
  volumeUnit: VolumeUnit;
};

const columns = (volumeUnit: VolumeUnit): DataColumn<SystemRow>[] => [
  {
    id: "code",
    head: "Code",
    rowHead: true,
    tight: true,
    cell: (system) => (
      <Link className="link" href={`/setup/systems/${system.code}`}>
        {system.code}
      </Link>
    ),
  },
  { id: "name", head: "Name", cell: (system) => system.name },
  { id: "area", head: "Area", tight: true, cell: (system) => system.areaCode },
  { id: "kind", head: "Kind", wideOnly: true, cell: (system) => SYSTEM_KIND_WORDS[system.kind] },
  { id: "water", head: "Water", wideOnly: true, cell: (system) => WATER_TYPE_WORDS[system.waterType] },
  { id: "state", head: "State", cell: (system) => SYSTEM_STATE_WORDS[system.state] },
  {
    id: "volume",
    head: "Volume of record",
    numeric: true,
    cell: ({ volumeL }) => {
      if (volumeL === null) return <Quantity value={null} decimals={0} />;
      return <Quantity {...plainVolume(convertByFactor(volumeL, "L", volumeUnit))} unit={volumeUnit} />;
    },
  },
];

/** Setup: every system, in walking order; each opens with its points and equipment. */
export function SystemsSetup({ systems, areas, mayManage, volumeUnit }: SystemsSetupProps) {
  const [isAdding, setAdding] = useState(false);
  const done = useDone();
  const router = useRouter();
  const add = mayManage && areas.length > 0 && (
    <Button variant="next" onClick={() => setAdding(true)}>
      Add a system
    </Button>
  );
  return (
    <>
      <PageHead
        title="Systems"
        facts={systems.length === 1 ? "1 system" : `${systems.length} systems`}
        actions={systems.length > 0 && add}
      />
      <DataTable
        caption="Systems in walking order"
        rows={systems}
        rowKey={(system) => system.id}
        columns={columns(volumeUnit)}
        empty={
          <EmptyState title="No systems yet" actions={add}>
            A system is one body of water with its own life support: an exhibit, a holding tank, a reservoir.
            It comes with a point at its surface, so that readings can begin at once.{" "}
            {areas.length === 0 && (
              <>
                It stands in an area:{" "}
                <Link className="link" href="/setup/areas">
                  set up the areas first
                </Link>
                .
              </>
            )}
          </EmptyState>
        }
      />
      {isAdding && (
        <SystemForm
          system={null}
          areas={areas}
          onClose={() => setAdding(false)}
          onDone={(text, code) => {
            setAdding(false);
            done(text);
            router.push(`/setup/systems/${code}`);
          }}
        />
      )}
    </>
  );
}
