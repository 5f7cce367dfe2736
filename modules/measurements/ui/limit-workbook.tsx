"use client";
import { useState } from "react";
import { Button, type DataColumn, DataTable, Notice, PageHead, Panel, TimeText, useDone } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { LimitState, LimitWorkbookDetail } from "../model";
import { DecideLimitsForm } from "./decide-limits-form";
import { LimitShapeText } from "./limit-shape-text";

export interface LimitWorkbookPageProps {
  detail: LimitWorkbookDetail;
  parameters: FacilityParameter[];
  names: Readonly<Record<number, string>>;
  zone: string;
  viewerId: number | null;
  mayApprove: boolean;
}

const STATE_WORDS: Readonly<Record<LimitState, string>> = {
  proposed: "waits for approval",
  approved: "approved",
  declined: "declined",
};

/** A workbook of limits: each row old beside new, who is waited for, and the one act that decides on all of it. */
export function LimitWorkbookPage(props: LimitWorkbookPageProps) {
  const { detail, parameters, names, zone, viewerId, mayApprove } = props;
  const { workbook, rows, signatures } = detail;
  const [open, setOpen] = useState<"approve" | "decline" | null>(null);
  const done = useDone();
  const isOwn = viewerId === workbook.proposedBy;
  const waits = workbook.state === "proposed";
  const decides = waits && mayApprove && !isOwn;
  return (
    <>
      <PageHead
        title={workbook.title}
        facts={
          <>
            {rows.length === 1 ? "1 row" : `${rows.length} rows`}, proposed by {names[workbook.proposedBy]},{" "}
            <TimeText at={workbook.proposedAt} zone={zone} /> · {STATE_WORDS[workbook.state]}
          </>
        }
        waiting={decides ? "You can approve or decline all of it in one act." : undefined}
        actions={
          decides && (
            <>
              <Button variant="next" onClick={() => setOpen("approve")}>
                Approve…
              </Button>
              <Button onClick={() => setOpen("decline")}>Decline…</Button>
            </>
          )
        }
      />
      <div className="grid gap-5">
        {waits && !decides && <WaitedFor isOwn={isOwn} proposer={names[workbook.proposedBy] ?? ""} />}
        <p>
          <b className="font-semibold">Reason:</b> {workbook.reason}
        </p>
        <Panel title="Limits" aside="old beside new">
          <DataTable
            caption={`Limits of the workbook ${workbook.title}`}
            rows={rows}
            rowKey={(row) => row.id}
            columns={columns(parameters, zone)}
          />
        </Panel>
        {signatures.length > 0 && <Signatures signatures={signatures} zone={zone} />}
      </div>
      {open !== null && (
        <DecideLimitsForm
          workbook={workbook}
          rowCount={rows.length}
          decision={open}
          onClose={() => setOpen(null)}
          onDone={(text) => {
            setOpen(null);
            done(text);
          }}
        />
      )}
    </>
  );
}

function WaitedFor({ isOwn, proposer }: { isOwn: boolean; proposer: string }) {
  if (isOwn) {
    return (
      <Notice title="Waits for another person">
        You proposed these limits yourself, so you can neither approve nor decline them, whatever your roles.
        Another water-quality lead decides.
      </Notice>
    );
  }
  return (
    <Notice title="Waits for a water-quality lead">
      A lead other than {proposer} decides on all of it in one act. Your roles do not include that.
    </Notice>
  );
}

function Signatures({ signatures, zone }: Pick<LimitWorkbookDetail, "signatures"> & { zone: string }) {
  return (
    <Panel title="Signed">
      <ul className="grid gap-2">
        {signatures.map((each) => (
          <li key={each.id}>
            <b className="font-semibold">{each.printedName}</b>, <TimeText at={each.signedAt} zone={zone} />:{" "}
            {each.meaning}
            {each.comment !== null && `, “${each.comment}”`}
            {each.holds === false && (
              <span className="block font-semibold text-out">
                What stands here is not what was signed. Tell your administrator.
              </span>
            )}
          </li>
        ))}
      </ul>
    </Panel>
  );
}

type Row = LimitWorkbookDetail["rows"][number];

function columns(parameters: readonly FacilityParameter[], zone: string): DataColumn<Row>[] {
  const parameterOf = (row: Row) => parameters.find((each) => each.id === row.parameterId);
  return [
    {
      id: "what",
      head: "Point, parameter",
      rowHead: true,
      cell: (row) => {
        const parameter = parameterOf(row);
        return (
          <>
            <span className="block text-sm font-normal text-ink-3">
              {row.place?.systemCode} {row.place?.pointName}
            </span>
            {parameter?.name}
            {parameter && unitLabel(parameter.unit) !== "" && (
              <span className="unit">{unitLabel(parameter.unit)}</span>
            )}
          </>
        );
      },
    },
    {
      id: "old",
      head: "Old",
      cell: (row) =>
        row.before === null ? (
          <span className="text-ink-3">no limits</span>
        ) : (
          <LimitShapeText {...row.before} decimals={parameterOf(row)?.decimals ?? 1} zone={zone} />
        ),
    },
    {
      id: "new",
      head: "New",
      cell: (row) => <LimitShapeText {...row} decimals={parameterOf(row)?.decimals ?? 1} zone={zone} />,
    },
    {
      id: "from",
      head: "Holds",
      cell: (row) => (
        <>
          from <TimeText at={row.effectiveFromAt} zone={zone} />
          {row.effectiveToAt !== null && (
            <>
              {" "}
              until <TimeText at={row.effectiveToAt} zone={zone} />
            </>
          )}
        </>
      ),
    },
  ];
}
