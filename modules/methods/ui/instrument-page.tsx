"use client";
import { useState } from "react";
import {
  Button,
  type DataColumn,
  DataTable,
  Facts,
  Notice,
  PageHead,
  Panel,
  Quantity,
  TimeText,
  useDone,
} from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import {
  CHECK_VERDICT_WORDS,
  type FacilityParameter,
  INSTRUMENT_STATE_WORDS,
  type InstrumentCheckRow,
  type InstrumentDetail,
} from "../model";
import { CheckForm } from "./check-form";
import { DueText } from "./due-text";
import { EditInstrumentForm } from "./instrument-form";

export interface InstrumentPageProps {
  instrument: InstrumentDetail;
  parameters: FacilityParameter[];
  /** Names of people by id. */
  names: Readonly<Record<number, string>>;
  zone: string;
  mayManage: boolean;
  mayCheck: boolean;
}

/** One instrument: what it is, and every check of it. */
export function InstrumentPage({
  instrument,
  parameters,
  names,
  zone,
  mayManage,
  mayCheck,
}: InstrumentPageProps) {
  const [open, setOpen] = useState<"edit" | "check" | null>(null);
  const done = useDone();
  const close = () => setOpen(null);
  const finish = (text: string) => {
    close();
    done(text);
  };
  const isRetired = instrument.state === "retired";
  return (
    <>
      <PageHead
        title={instrument.code}
        name={instrument.name}
        facts={`Serial ${instrument.serial} · ${instrument.principle}${instrument.scale === null ? "" : ` · ${instrument.scale}`} · ${INSTRUMENT_STATE_WORDS[instrument.state]}`}
        figures={
          <Facts
            facts={[
              {
                label: "Checked every",
                value:
                  instrument.checkEveryDays === null ? "no interval" : `${instrument.checkEveryDays} days`,
              },
              { label: "Next check", value: <DueText instrument={instrument} /> },
            ]}
          />
        }
        actions={
          !isRetired && (
            <>
              {mayCheck && (
                <Button variant="next" onClick={() => setOpen("check")}>
                  Record a check
                </Button>
              )}
              {mayManage && <Button onClick={() => setOpen("edit")}>Edit</Button>}
            </>
          )
        }
      />
      <div className="grid gap-5">
        {isRetired && <Notice title="Retired">{instrument.retiredReason}</Notice>}
        {instrument.due.state === "failed" && !isRetired && (
          <Notice kind="caution" title="The last check failed">
            Do not use it until a check is good. What was read with it since the last good check deserves a
            second look by a water-quality lead.
          </Notice>
        )}
        <Panel title="Checks" aside="newest first">
          <DataTable
            caption={`Checks of ${instrument.code}`}
            rows={instrument.checks}
            rowKey={(each) => each.id}
            rowStatus={(each) => (each.verdict === "failed" ? "out" : undefined)}
            columns={columns(zone, names)}
            empty={<p className="text-ink-2">No check yet. The first one says how far it can be trusted.</p>}
          />
        </Panel>
      </div>
      {open === "edit" && <EditInstrumentForm instrument={instrument} onClose={close} onDone={finish} />}
      {open === "check" && (
        <CheckForm instrument={instrument} parameters={parameters} onClose={close} onDone={finish} />
      )}
    </>
  );
}

function columns(zone: string, names: Readonly<Record<number, string>>): DataColumn<InstrumentCheckRow>[] {
  const figure = (value: number | null, unit: string | null) =>
    value === null ? (
      <Quantity value={null} decimals={0} />
    ) : (
      <span className="num">
        {String(value).replace("-", "−")}
        {unit !== null && unitLabel(unit) !== "" && <span className="unit">{unitLabel(unit)}</span>}
      </span>
    );
  return [
    {
      id: "at",
      head: "Checked",
      rowHead: true,
      tight: true,
      cell: (each) => (
        <>
          <TimeText at={each.checkedAt} zone={zone} />
          <span className="block text-sm font-normal text-ink-3">{names[each.checkedBy]}</span>
        </>
      ),
    },
    {
      id: "standard",
      head: "Against",
      wideOnly: true,
      cell: (each) => (
        <>
          {each.standard}
          {each.parameterName !== null && (
            <span className="block text-sm text-ink-3">for {each.parameterName}</span>
          )}
        </>
      ),
    },
    {
      id: "value",
      head: "Standard",
      numeric: true,
      wideOnly: true,
      cell: (each) => figure(each.standardValue, each.unit),
    },
    { id: "found", head: "As found", numeric: true, cell: (each) => figure(each.asFound, each.unit) },
    { id: "left", head: "As left", numeric: true, cell: (each) => figure(each.asLeft, each.unit) },
    {
      id: "verdict",
      head: "Verdict",
      cell: (each) => (
        <>
          <span className={each.verdict === "failed" ? "font-semibold text-out" : ""}>
            {CHECK_VERDICT_WORDS[each.verdict]}
          </span>
          {each.note !== "" && <span className="block text-sm text-ink-3">{each.note}</span>}
        </>
      ),
    },
  ];
}
