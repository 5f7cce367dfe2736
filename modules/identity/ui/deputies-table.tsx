"use client";
import { Button, type DataColumn, DataTable, EmptyState, useAct } from "@/lib/ui";
import type { Role } from "@/modules/access";
import { dayWords } from "./day-words";
import { roleText } from "./role-words";

export interface DeputyRow {
  id: number;
  role: Role;
  fromOn: string;
  toOn: string;
  person: string;
  deputy: string;
  mayEnd: boolean;
}

function stateOf(row: DeputyRow, today: string): string {
  if (row.toOn < today) return "over";
  return row.fromOn <= today ? "stands in now" : "from then on";
}

/** Who stands in for whom. */
export function DeputiesTable({ rows, today }: { rows: readonly DeputyRow[]; today: string }) {
  const { act, busy } = useAct();
  const columns: DataColumn<DeputyRow>[] = [
    { id: "deputy", head: "Stands in", rowHead: true, cell: (row) => row.deputy },
    { id: "person", head: "For", cell: (row) => row.person },
    { id: "role", head: "As", cell: (row) => roleText(row.role) },
    { id: "days", head: "Days", cell: (row) => `${dayWords(row.fromOn)} to ${dayWords(row.toOn)}` },
    { id: "state", head: "State", cell: (row) => stateOf(row, today) },
    {
      id: "end",
      head: "",
      cell: (row) =>
        row.mayEnd && row.toOn >= today ? (
          <Button
            size="small"
            busy={busy}
            aria-label={`End: ${row.deputy} for ${row.person}`}
            onClick={() => void act(`/api/v1/deputies/${row.id}/end`, {}, { done: "Ended." })}
          >
            End
          </Button>
        ) : null,
    },
  ];
  return (
    <DataTable
      caption="Deputies"
      columns={columns}
      rows={rows}
      rowKey={(row) => row.id}
      empty={
        <EmptyState title="No deputies named">
          <p>Before days off, name who decides instead: reviews and approvals then wait for nobody.</p>
        </EmptyState>
      }
    />
  );
}
