"use client";
import { useState } from "react";
import {
  Button,
  type DataColumn,
  DataTable,
  EmptyState,
  numberText,
  PageHead,
  Panel,
  useDone,
} from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import {
  ANSWER_MEANING_WORDS,
  type FacilityParameter,
  PARAMETER_GROUP_WORDS,
  PARAMETER_GROUPS,
  PARAMETER_KIND_WORDS,
  type ParameterDefinition,
} from "../model";
import { CatalogueDialog } from "./catalogue-dialog";
import { ParameterForm } from "./parameter-form";
import { RetireParameterForm } from "./retire-parameter-form";

type Open =
  | { kind: "form"; parameter: FacilityParameter | null }
  | { kind: "retire"; parameter: FacilityParameter }
  | { kind: "catalogue" }
  | null;

export interface ParametersSetupProps {
  parameters: FacilityParameter[];
  /** Entries of the starter catalogue that are not there yet. */
  missing: ParameterDefinition[];
  mayManage: boolean;
}

/** Setup: what is measured or checked, by group. */
export function ParametersSetup({ parameters, missing, mayManage }: ParametersSetupProps) {
  const [open, setOpen] = useState<Open>(null);
  const done = useDone();
  const close = () => setOpen(null);
  const finish = (text: string) => {
    close();
    done(text);
  };
  const inUse = parameters.filter((each) => !each.isRetired).length;
  const fromCatalogue = mayManage && missing.length > 0 && (
    <Button
      variant={parameters.length === 0 ? "next" : "plain"}
      onClick={() => setOpen({ kind: "catalogue" })}
    >
      Add from the catalogue
    </Button>
  );
  const own = mayManage && (
    <Button
      variant={parameters.length === 0 ? "plain" : "next"}
      onClick={() => setOpen({ kind: "form", parameter: null })}
    >
      Set up a parameter
    </Button>
  );
  return (
    <>
      <PageHead
        title="Parameters"
        facts={`${inUse} in use${parameters.length > inUse ? `, ${parameters.length - inUse} retired` : ""}`}
        actions={
          parameters.length > 0 && (
            <>
              {own}
              {fromCatalogue}
            </>
          )
        }
      />
      {parameters.length === 0 && (
        <EmptyState
          title="No parameters yet"
          actions={
            <>
              {fromCatalogue}
              {own}
            </>
          }
        >
          A parameter is what is measured or checked: a temperature, a count, a yes or no. The starter
          catalogue has what marine work commonly needs.
        </EmptyState>
      )}
      <div className="grid gap-5">
        {PARAMETER_GROUPS.map((group) => {
          const rows = parameters.filter((each) => each.group === group);
          if (rows.length === 0) return null;
          return (
            <Panel key={group} title={PARAMETER_GROUP_WORDS[group]}>
              <DataTable
                caption={`Parameters: ${PARAMETER_GROUP_WORDS[group]}`}
                rows={rows}
                rowKey={(each) => each.id}
                columns={mayManage ? [...COLUMNS, actColumn(setOpen)] : COLUMNS}
              />
            </Panel>
          );
        })}
      </div>
      {open?.kind === "form" && <ParameterForm parameter={open.parameter} onClose={close} onDone={finish} />}
      {open?.kind === "retire" && (
        <RetireParameterForm parameter={open.parameter} onClose={close} onDone={finish} />
      )}
      {open?.kind === "catalogue" && <CatalogueDialog missing={missing} onClose={close} />}
    </>
  );
}

const COLUMNS: DataColumn<FacilityParameter>[] = [
  {
    id: "name",
    head: "Name",
    rowHead: true,
    cell: (each) => (
      <>
        {each.name}
        {each.isRetired && <span className="font-normal text-ink-3"> (retired)</span>}
        <span className="block text-sm font-normal text-ink-3">{each.code}</span>
      </>
    ),
  },
  {
    id: "unit",
    head: "Unit",
    tight: true,
    cell: (each) => unitLabel(each.unit) || each.unit || PARAMETER_KIND_WORDS[each.kind],
  },
  {
    id: "accepted",
    head: "May be typed in, or answered with",
    wideOnly: true,
    cell: (each) =>
      each.choices.length > 0
        ? each.choices.map((choice) => `${choice.label} (${ANSWER_MEANING_WORDS[choice.means]})`).join(", ")
        : each.acceptedUnits.map((code) => unitLabel(code) || code).join(", "),
  },
  {
    id: "decimals",
    head: "Decimals",
    numeric: true,
    wideOnly: true,
    cell: (each) => (each.kind === "number" ? each.decimals : ""),
  },
  { id: "plausible", head: "Plausible", wideOnly: true, tight: true, cell: plausibleText },
];

function plausibleText({ plausible: { low, high }, decimals }: FacilityParameter): string {
  const show = (value: number) => numberText(value, Number.isInteger(value) ? 0 : decimals);
  if (low !== null && high !== null) return `${show(low)} to ${show(high)}`;
  if (low !== null) return `from ${show(low)}`;
  return high === null ? "" : `to ${show(high)}`;
}

const actColumn = (setOpen: (open: Open) => void): DataColumn<FacilityParameter> => ({
  id: "act",
  head: <span className="sr-only">Act</span>,
  tight: true,
  cell: (parameter) =>
    !parameter.isRetired && (
      <span className="flex justify-end gap-2 max-sm:flex-wrap">
        <Button
          size="small"
          aria-label={`Edit ${parameter.name}`}
          onClick={() => setOpen({ kind: "form", parameter })}
        >
          Edit
        </Button>
        <Button
          size="small"
          variant="quiet"
          aria-label={`Retire ${parameter.name}`}
          onClick={() => setOpen({ kind: "retire", parameter })}
        >
          Retire
        </Button>
      </span>
    ),
});
