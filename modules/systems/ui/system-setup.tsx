"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, DataTable, LinkButton, Notice, PageHead, Panel, TimeText, useDone } from "@/lib/ui";
import {
  type AreaRow,
  EQUIPMENT_KIND_WORDS,
  type EquipmentRow,
  POINT_KIND_WORDS,
  type PointRow,
  SYSTEM_KIND_WORDS,
  SYSTEM_STATE_WORDS,
  type SystemDetail,
  WATER_TYPE_WORDS,
} from "../model";
import { EquipmentForm } from "./equipment-form";
import { capital } from "./options";
import { PointForm } from "./point-form";
import { RetireForm, SystemForm } from "./system-form";

type Open =
  | { kind: "system" }
  | { kind: "retire" }
  | { kind: "point"; point: PointRow | null }
  | { kind: "equipment"; equipment: EquipmentRow | null }
  | null;

type SystemSetupProps = {
  system: SystemDetail;
  areas: AreaRow[];
  zone: string;
  mayManage: boolean;
  mayManageEquipment: boolean;
};

/** Setup of one system: what it is, its points and its equipment. */
export function SystemSetup({ system, areas, zone, mayManage, mayManageEquipment }: SystemSetupProps) {
  const [open, setOpen] = useState<Open>(null);
  const done = useDone();
  const router = useRouter();
  const close = () => setOpen(null);
  const finish = (text: string) => {
    close();
    done(text);
  };
  const isRetired = system.state === "retired";
  return (
    <>
      <PageHead
        title={system.code}
        name={system.name}
        facts={`${capital(SYSTEM_KIND_WORDS[system.kind])} · ${WATER_TYPE_WORDS[system.waterType]} · ${system.areaName} · biosecurity level ${system.biosecurityLevel} · ${SYSTEM_STATE_WORDS[system.state]}`}
        actions={
          <>
            <LinkButton href={`/systems/${system.code}/volume`}>Volume</LinkButton>
            {mayManage && !isRetired && (
              <>
                <Button onClick={() => setOpen({ kind: "system" })}>Edit</Button>
                <Button variant="danger" onClick={() => setOpen({ kind: "retire" })}>
                  Retire
                </Button>
              </>
            )}
          </>
        }
      />
      <div className="grid gap-5">
        {isRetired && system.retiredAt !== null && (
          <Notice title="Retired">
            Since <TimeText at={system.retiredAt} zone={zone} />: {system.retiredReason}
          </Notice>
        )}
        {system.notes !== "" && <p className="prose whitespace-pre-line">{system.notes}</p>}
        <PointsPanel
          points={system.points}
          onOpen={mayManage && !isRetired ? (point) => setOpen({ kind: "point", point }) : null}
        />
        <EquipmentPanel
          equipment={system.equipment}
          onOpen={mayManageEquipment ? (equipment) => setOpen({ kind: "equipment", equipment }) : null}
          mayAdd={!isRetired}
        />
      </div>
      {open?.kind === "system" && (
        <SystemForm
          system={system}
          areas={areas}
          onClose={close}
          onDone={(text, code) => {
            finish(text);
            if (code !== system.code) router.replace(`/setup/systems/${code}`);
          }}
        />
      )}
      {open?.kind === "retire" && <RetireForm system={system} onClose={close} onDone={finish} />}
      {open?.kind === "point" && (
        <PointForm system={system} point={open.point} onClose={close} onDone={finish} />
      )}
      {open?.kind === "equipment" && (
        <EquipmentForm system={system} equipment={open.equipment} onClose={close} onDone={finish} />
      )}
    </>
  );
}

function PointsPanel({
  points,
  onOpen,
}: {
  points: PointRow[];
  onOpen: ((point: PointRow | null) => void) | null;
}) {
  return (
    <Panel
      title="Points"
      aside="where readings are taken"
      actions={
        onOpen && (
          <Button size="small" onClick={() => onOpen(null)}>
            Add a point
          </Button>
        )
      }
    >
      <DataTable
        caption="Points of this system"
        rows={points}
        rowKey={(point) => point.id}
        columns={[
          { id: "code", head: "Code", rowHead: true, tight: true, cell: (point) => point.code },
          { id: "name", head: "Name", cell: (point) => point.name },
          { id: "kind", head: "Kind", wideOnly: true, cell: (point) => POINT_KIND_WORDS[point.kind] },
          {
            id: "use",
            head: "Use",
            cell: (point) => (point.isDefault ? "default" : point.isInUse ? "in use" : "out of use"),
          },
          ...(onOpen
            ? [
                {
                  id: "edit",
                  head: <span className="sr-only">Act</span>,
                  cell: (point: PointRow) => (
                    <Button
                      size="small"
                      aria-label={`Edit point ${point.code}`}
                      onClick={() => onOpen(point)}
                    >
                      Edit
                    </Button>
                  ),
                },
              ]
            : []),
        ]}
      />
    </Panel>
  );
}

type EquipmentPanelProps = {
  equipment: EquipmentRow[];
  onOpen: ((equipment: EquipmentRow | null) => void) | null;
  mayAdd: boolean;
};

function EquipmentPanel({ equipment, onOpen, mayAdd }: EquipmentPanelProps) {
  return (
    <Panel
      title="Equipment"
      actions={
        onOpen &&
        mayAdd && (
          <Button size="small" onClick={() => onOpen(null)}>
            Add equipment
          </Button>
        )
      }
    >
      <DataTable
        caption="Equipment of this system"
        rows={equipment}
        rowKey={(each) => each.id}
        empty={
          <p className="text-ink-2">
            No equipment yet. Pumps, filters, ozone generators and the like stand here, so that checks and
            work can name them.
          </p>
        }
        columns={[
          { id: "code", head: "Code", rowHead: true, tight: true, cell: (each) => each.code },
          { id: "name", head: "Name", cell: (each) => each.name },
          { id: "kind", head: "Kind", wideOnly: true, cell: (each) => EQUIPMENT_KIND_WORDS[each.kind] },
          { id: "state", head: "State", cell: (each) => SYSTEM_STATE_WORDS[each.state] },
          ...(onOpen
            ? [
                {
                  id: "edit",
                  head: <span className="sr-only">Act</span>,
                  cell: (each: EquipmentRow) => (
                    <Button size="small" aria-label={`Edit ${each.code}`} onClick={() => onOpen(each)}>
                      Edit
                    </Button>
                  ),
                },
              ]
            : []),
        ]}
      />
    </Panel>
  );
}
