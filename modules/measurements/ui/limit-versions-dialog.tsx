"use client";
import Link from "next/link";
import { Button, Dialog, TimeText } from "@/lib/ui";
import type { FacilityParameter } from "@/modules/methods/model";
import type { LimitBoardRow, LimitVersionRow } from "../model";
import { LimitShapeText } from "./limit-shape-text";

export interface LimitVersionsDialogProps {
  row: LimitBoardRow;
  parameter: FacilityParameter;
  names: Readonly<Record<number, string>>;
  zone: string;
  onClose: () => void;
}

/** Every version of the limits of a point and parameter, newest first: what, from when, who proposed and who decided. */
export function LimitVersionsDialog({ row, parameter, names, zone, onClose }: LimitVersionsDialogProps) {
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Limits of ${parameter.name} at ${row.systemCode} ${row.pointName}`}
      width="wide"
      actions={<Button onClick={onClose}>Close</Button>}
    >
      {row.versions.length === 0 && <p>There have never been any.</p>}
      <ol className="divide-y divide-rule">
        {row.versions.map((version) => (
          <li key={version.id} className="py-3 first:pt-0 last:pb-0">
            <p className="flex flex-wrap items-baseline gap-x-3">
              <b className="font-semibold">Version {version.version}</b>
              <span>{stateWords(version, row)}</span>
              <span className="text-ink-2">
                from <TimeText at={version.effectiveFromAt} zone={zone} />
                {version.effectiveToAt !== null && (
                  <>
                    {" "}
                    until <TimeText at={version.effectiveToAt} zone={zone} />
                  </>
                )}
              </span>
            </p>
            <div className="mt-1">
              <LimitShapeText
                shape={version.shape}
                suspendedReason={version.suspended?.reason ?? null}
                decimals={parameter.decimals}
                zone={zone}
              />
            </div>
            <Decision version={version} names={names} zone={zone} />
          </li>
        ))}
      </ol>
    </Dialog>
  );
}

function stateWords(version: LimitVersionRow, { limits }: LimitBoardRow): string {
  if (version.state === "proposed") return "waits for approval";
  if (version.state === "declined") return "declined";
  return limits.state !== "none" && limits.versionId === version.id ? "in force now" : "approved";
}

type DecisionProps = Pick<LimitVersionsDialogProps, "names" | "zone"> & { version: LimitVersionRow };

function Decision({ version, names, zone }: DecisionProps) {
  return (
    <p className="mt-1 text-sm text-ink-2">
      <Link className="link" href={`/setup/limits/workbooks/${version.workbookId}`}>
        {version.workbookTitle}
      </Link>
      : proposed by {names[version.proposedBy]}, <TimeText at={version.proposedAt} zone={zone} show="day" /> (
      {version.reason})
      {version.decidedBy !== null && version.decidedAt !== null && (
        <>
          ; {version.state} by {names[version.decidedBy]},{" "}
          <TimeText at={version.decidedAt} zone={zone} show="day" />
          {version.decisionComment !== null &&
            version.decisionComment !== "" &&
            ` (${version.decisionComment})`}
        </>
      )}
    </p>
  );
}
