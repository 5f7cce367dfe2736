"use client";
import { useState } from "react";
import { Button, Facts, LinkButton, Notice, numberText, PageHead, TimeText, useDone } from "@/lib/ui";
import { convertByFactor } from "@/lib/units/factors";
import type { DeterminationRow, OperatingLevelRow, SystemRow, VolumeSheet } from "../model";
import { ApproveForm, DeclineForm } from "./decide-forms";
import { DeterminationList } from "./determination-list";
import { GeometryEditor } from "./geometry-editor";
import { LevelForm } from "./level-form";
import { TracerForm } from "./tracer-form";
import { VolumeQuantity } from "./volume-quantity";
import type { ReadingUnits } from "./volume-units";

type VolumePageProps = {
  sheet: VolumeSheet;
  systems: SystemRow[];
  zone: string;
  units: ReadingUnits;
  personId: number | null;
  may: { propose: boolean; approve: boolean; setLevel: boolean };
};

type Open =
  | { kind: "geometry" | "tracer" | "level" }
  | { kind: "approve" | "decline"; row: DeterminationRow }
  | null;

/** How much water a system holds: of record and today, and every determination of it. */
export function VolumePage({ sheet, systems, zone, units, personId, may }: VolumePageProps) {
  const [open, setOpen] = useState<Open>(null);
  const done = useDone();
  const { system } = sheet;
  const close = () => setOpen(null);
  const finish = (text: string) => {
    close();
    done(text);
  };
  const isRetired = system.state === "retired";
  const isEditing = open?.kind === "geometry" || open?.kind === "tracer";
  const waiting = sheet.determinations.filter(
    (row) => row.status === "proposed" && row.proposedById !== personId,
  );
  return (
    <>
      <PageHead
        title={`Volume of ${system.code}`}
        name={system.name}
        figures={<VolumeFacts sheet={sheet} units={units} />}
        waiting={
          may.approve && waiting.length > 0
            ? `${waiting.length} proposed ${waiting.length === 1 ? "volume" : "volumes"} to decide on`
            : undefined
        }
        actions={
          !isRetired &&
          !isEditing && (
            <>
              {may.setLevel && <Button onClick={() => setOpen({ kind: "level" })}>Set the level</Button>}
              {may.propose && (
                <>
                  <Button onClick={() => setOpen({ kind: "geometry" })}>Propose from geometry</Button>
                  <Button onClick={() => setOpen({ kind: "tracer" })}>Propose from a tracer test</Button>
                </>
              )}
              <LinkButton variant="quiet" href={`/setup/systems/${system.code}`}>
                Points and equipment
              </LinkButton>
            </>
          )
        }
      />
      <div className="grid gap-5">
        <LevelNotices sheet={sheet} zone={zone} />
        {open?.kind === "geometry" && (
          <GeometryEditor
            systemId={system.id}
            begin={sheet.determinations.find((row) => row.geometry)?.geometry?.typed ?? []}
            units={units}
            zone={zone}
            onClose={close}
            onDone={finish}
          />
        )}
        {open?.kind === "tracer" && (
          <TracerForm systemId={system.id} units={units} zone={zone} onClose={close} onDone={finish} />
        )}
        {!isEditing && (
          <DeterminationList
            determinations={sheet.determinations}
            zone={zone}
            unit={units.volume}
            personId={personId}
            mayApprove={may.approve}
            onApprove={(row) => setOpen({ kind: "approve", row })}
            onDecline={(row) => setOpen({ kind: "decline", row })}
          />
        )}
      </div>
      {open?.kind === "level" && (
        <LevelForm
          sheet={sheet}
          partners={systems.filter((each) => each.id !== system.id && each.state !== "retired")}
          onClose={close}
          onDone={finish}
        />
      )}
      {open?.kind === "approve" && (
        <ApproveForm proposed={open.row} unit={units.volume} onClose={close} onDone={finish} />
      )}
      {open?.kind === "decline" && (
        <DeclineForm proposed={open.row} unit={units.volume} onClose={close} onDone={finish} />
      )}
    </>
  );
}

function VolumeFacts({ sheet, units }: { sheet: VolumeSheet; units: ReadingUnits }) {
  const { record, operating, joinedTotal } = sheet;
  const recordL = record && { value: record.volumeL, standardUncertainty: record.standardUncertaintyL };
  const facts = [
    { label: "Volume of record", value: <VolumeQuantity volumeL={recordL} unit={units.volume} /> },
    { label: "Holds today", value: <VolumeQuantity volumeL={operating} unit={units.volume} /> },
    ...(joinedTotal
      ? [{ label: "Joined, together", value: <VolumeQuantity volumeL={joinedTotal} unit={units.volume} /> }]
      : []),
  ];
  return <Facts facts={facts} />;
}

function LevelNotices({ sheet, zone }: { sheet: VolumeSheet; zone: string }) {
  const { level, operatingSays, record, joinedWith, joinedElsewhere, joinedTotal } = sheet;
  const names = joinedWith.map((each) => each.code);
  if (joinedElsewhere > 0) names.push(`${joinedElsewhere} in areas that you do not see`);
  return (
    <>
      {level && <LevelNotice level={level} zone={zone} />}
      {names.length > 0 && (
        <Notice title={`Shares its water with ${names.join(", ")}`}>
          {joinedTotal === null &&
            "What they hold together cannot be told: one of them cannot be counted today."}
        </Notice>
      )}
      {operatingSays !== null && record && (
        <Notice title="What it holds today cannot be told">{operatingSays}</Notice>
      )}
    </>
  );
}

function LevelNotice({ level, zone }: { level: OperatingLevelRow; zone: string }) {
  const offsetCm = convertByFactor(level.levelOffsetM, "m", "cm");
  const isAsDetermined = !level.isDrained && level.levelOffsetM === 0;
  if (isAsDetermined) return null;
  const title = level.isDrained ? "Drained" : `Level ${offsetCm > 0 ? "+" : ""}${numberText(offsetCm, 1)} cm`;
  return (
    <Notice title={title}>
      {level.reason} ({level.setBy ?? "Stillwell"}, <TimeText at={level.setAt} zone={zone} />)
    </Notice>
  );
}
