import Link from "next/link";
import { DataTable, Panel, STATUS_WORDS, TimeText } from "@/lib/ui";
import type { FacilityParameter } from "@/modules/methods/model";
import { asCounted, asTyped, type JudgementRow, type ReadingVersion } from "./reading-view";

interface ReadingVersionsProps {
  versions: readonly ReadingVersion[];
  judgements: readonly JudgementRow[];
  parameter: FacilityParameter;
  shownId: number;
  zone: string;
  name: (id: number | null) => string;
}

/** Old beside new: every version of a reading that has been corrected, with the reason. */
export function ReadingVersions({
  versions,
  judgements,
  parameter,
  shownId,
  zone,
  name,
}: ReadingVersionsProps) {
  if (versions.length < 2) return null;
  const statusOf = (id: number) => judgements.findLast((each) => each.readingId === id)?.status;
  return (
    <Panel title="Versions" aside="oldest first" className="desk:col-span-2">
      <DataTable
        caption="Versions of this reading"
        rows={versions}
        rowKey={(row) => row.id}
        columns={[
          {
            id: "value",
            head: "Value",
            numeric: true,
            rowHead: true,
            cell: (row) =>
              row.id === shownId ? (
                asCounted(row, parameter)
              ) : (
                <Link href={`/readings/${row.id}`}>{asCounted(row, parameter)}</Link>
              ),
          },
          { id: "typed", head: "As typed", numeric: true, cell: asTyped },
          {
            id: "status",
            head: "Status",
            cell: (row) => {
              const status = statusOf(row.id);
              return status ? STATUS_WORDS[status] : "";
            },
          },
          {
            id: "entered",
            head: "Entered",
            tight: true,
            cell: (row) => <TimeText at={row.enteredAt} zone={zone} />,
          },
          { id: "by", head: "By", cell: (row) => name(row.enteredBy) },
          {
            id: "why",
            head: "Why",
            cell: (row) =>
              row.correctionReason ?? (row.voidReason ? `struck out: ${row.voidReason}` : "first entry"),
          },
        ]}
      />
    </Panel>
  );
}
