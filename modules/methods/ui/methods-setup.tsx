"use client";
import { useState } from "react";
import { Button, type DataColumn, DataTable, EmptyState, PageHead, useDone } from "@/lib/ui";
import type { FacilityParameter, MethodRow } from "../model";
import { EditMethodForm, NewMethodForm } from "./method-form";

export interface MethodsSetupProps {
  methods: MethodRow[];
  parameters: FacilityParameter[];
  mayManage: boolean;
}

/** Setup: the written procedures by which parameters are measured. */
export function MethodsSetup({ methods, parameters, mayManage }: MethodsSetupProps) {
  const [open, setOpen] = useState<MethodRow | "new" | null>(null);
  const done = useDone();
  const close = () => setOpen(null);
  const finish = (text: string) => {
    close();
    done(text);
  };
  const add = mayManage && parameters.length > 0 && (
    <Button variant="next" onClick={() => setOpen("new")}>
      Set up a method
    </Button>
  );
  return (
    <>
      <PageHead
        title="Methods"
        facts={methods.length === 1 ? "1 method" : `${methods.length} methods`}
        actions={methods.length > 0 && add}
      />
      <DataTable
        caption="Methods by code"
        rows={methods}
        rowKey={(each) => each.id}
        columns={mayManage ? [...COLUMNS, editColumn(setOpen)] : COLUMNS}
        empty={
          <EmptyState title="No methods yet" actions={add}>
            A method is a written procedure by which a parameter is measured. A reading can name it, and what
            is read where can name one as the usual.
            {parameters.length === 0 && " It measures a parameter: set those up first."}
          </EmptyState>
        }
      />
      {open === "new" && <NewMethodForm parameters={parameters} onClose={close} onDone={finish} />}
      {open !== null && open !== "new" && <EditMethodForm method={open} onClose={close} onDone={finish} />}
    </>
  );
}

const COLUMNS: DataColumn<MethodRow>[] = [
  { id: "code", head: "Code", rowHead: true, tight: true, cell: (each) => each.code },
  {
    id: "name",
    head: "Name",
    cell: (each) => (
      <>
        {each.name}
        {each.isRetired && <span className="text-ink-3"> (retired)</span>}
      </>
    ),
  },
  { id: "measures", head: "Measures", cell: (each) => each.parameterName },
  { id: "principle", head: "Principle", wideOnly: true, cell: (each) => each.principle },
];

const editColumn = (setOpen: (open: MethodRow) => void): DataColumn<MethodRow> => ({
  id: "edit",
  head: <span className="sr-only">Act</span>,
  cell: (each) => (
    <Button size="small" aria-label={`Edit method ${each.code}`} onClick={() => setOpen(each)}>
      Edit
    </Button>
  ),
});
