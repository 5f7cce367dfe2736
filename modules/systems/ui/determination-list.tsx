"use client";
import { Button, ButtonRow, DataTable, EmptyState, Notice, Panel, TimeText } from "@/lib/ui";
import type { ComponentVolume, DeterminationRow, VolumeUnit } from "../model";
import { SHAPE_TABLE } from "../shapes.data";
import { litresOf } from "./component-state";
import { VolumeQuantity } from "./volume-quantity";

type DeterminationListProps = {
  determinations: DeterminationRow[];
  zone: string;
  unit: VolumeUnit;
  personId: number | null;
  mayApprove: boolean;
  onApprove: (row: DeterminationRow) => void;
  onDecline: (row: DeterminationRow) => void;
};

/** Every determination, the newest first, with what waits for whom. */
export function DeterminationList(props: DeterminationListProps) {
  if (props.determinations.length === 0) {
    return (
      <EmptyState title="No volume yet">
        A volume is proposed from the tank's geometry or from a tracer test, and counts once a water-quality
        lead, another person, has approved it. Doses and water changes are computed from it.
      </EmptyState>
    );
  }
  return (
    <div className="grid gap-5">
      {props.determinations.map((row) => (
        <Determination key={row.id} {...props} row={row} />
      ))}
    </div>
  );
}

const METHOD_WORDS = { geometry: "geometry", tracer: "tracer test" } as const;

function Determination({
  row,
  zone,
  unit,
  personId,
  mayApprove,
  onApprove,
  onDecline,
}: DeterminationListProps & { row: DeterminationRow }) {
  const isOwn = row.proposedById === personId;
  return (
    <Panel
      title={
        <VolumeQuantity
          volumeL={{ value: row.volumeL, standardUncertainty: row.standardUncertaintyL }}
          unit={unit}
        />
      }
      aside={`${METHOD_WORDS[row.method]} · ${row.isOfRecord ? "volume of record" : row.status}`}
    >
      <div className="grid gap-3">
        <p className="text-ink-2">
          Proposed by {row.proposedBy}, <TimeText at={row.proposedAt} zone={zone} />. Counts from{" "}
          <TimeText at={row.effectiveFromAt} zone={zone} />
          {row.decidedBy !== null && row.decidedAt !== null && (
            <>
              {" "}
              · {row.status} by {row.decidedBy}, <TimeText at={row.decidedAt} zone={zone} />
              {row.decisionReason !== null && `: ${row.decisionReason}`}
            </>
          )}
        </p>
        {row.note !== "" && <p className="prose whitespace-pre-line">{row.note}</p>}
        {row.disagreement !== null && (
          <Notice
            kind="caution"
            title={
              row.isOfRecord ? "It contradicts the volume before it" : "It contradicts the volume of record"
            }
          >
            {row.disagreement}
          </Notice>
        )}
        {row.geometry && <ComponentTable row={row} unit={unit} />}
        {row.status === "proposed" && !isOwn && mayApprove && (
          <ButtonRow>
            <Button variant="next" onClick={() => onApprove(row)}>
              Approve
            </Button>
            <Button onClick={() => onDecline(row)}>Decline</Button>
          </ButtonRow>
        )}
        {row.status === "proposed" && (isOwn || !mayApprove) && (
          <p className="font-semibold">
            Waits for a water-quality lead{isOwn && mayApprove ? " other than you" : ""}.
          </p>
        )}
      </div>
    </Panel>
  );
}

function ComponentTable({ row, unit }: { row: DeterminationRow; unit: VolumeUnit }) {
  const { typed, computed } = row.geometry ?? { typed: [], computed: [] };
  const lines = computed.map((volume, index) => ({ index, volume, typed: typed[index] }));
  return (
    <details>
      <summary className="link min-h-6 cursor-pointer">
        {lines.length === 1 ? "1 component" : `${lines.length} components`}
      </summary>
      <DataTable
        className="mt-2"
        caption="Components of this determination"
        rows={lines}
        rowKey={(line) => line.index}
        columns={[
          { id: "name", head: "Component", rowHead: true, cell: (line) => line.volume.name },
          {
            id: "shape",
            head: "Shape",
            wideOnly: true,
            cell: (line) => (line.typed ? SHAPE_TABLE[line.typed.shape].label : ""),
          },
          {
            id: "volume",
            head: "Holds",
            numeric: true,
            cell: (line) => <VolumeQuantity volumeL={litresOf(line.volume)} unit={unit} />,
          },
          {
            id: "most",
            head: "Most uncertain",
            wideOnly: true,
            cell: (line) => largestShare(line.volume, line.typed?.shape),
          },
        ]}
      />
    </details>
  );
}

/** The input whose uncertainty weighs most: what to measure better. */
function largestShare(volume: ComponentVolume, shape: keyof typeof SHAPE_TABLE | undefined): string {
  const [most] = volume.shares.toSorted((a, b) => b.contributionL - a.contributionL);
  if (!most || most.contributionL === 0 || !shape) return "–";
  if (most.input === "fillDepthM") return "depth of water";
  if (most.input === "displacementL") return "rockwork";
  return SHAPE_TABLE[shape].inputs.find((input) => input.name === most.input)?.label.toLowerCase() ?? "–";
}
