"use client";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, type DataColumn, DataTable, EmptyState, PageHead, TimeText, useDone } from "@/lib/ui";
import { CHECK_VERDICT_WORDS, INSTRUMENT_STATE_WORDS, type InstrumentRow } from "../model";
import { DueText } from "./due-text";
import { NewInstrumentForm } from "./instrument-form";

export interface InstrumentsSetupProps {
  instruments: InstrumentRow[];
  zone: string;
  mayManage: boolean;
}

/** Setup: the register of instruments with their last check and when the next is due. */
export function InstrumentsSetup({ instruments, zone, mayManage }: InstrumentsSetupProps) {
  const [isAdding, setAdding] = useState(false);
  const done = useDone();
  const router = useRouter();
  const overdue = instruments.filter((each) => each.due.isOverdue && each.state === "in-use").length;
  const add = mayManage && (
    <Button variant="next" onClick={() => setAdding(true)}>
      Set up an instrument
    </Button>
  );
  return (
    <>
      <PageHead
        title="Instruments"
        facts={`${instruments.length === 1 ? "1 instrument" : `${instruments.length} instruments`}${overdue > 0 ? `, ${overdue} in use without a valid check` : ""}`}
        actions={instruments.length > 0 && add}
      />
      <DataTable
        caption="Instruments by code"
        rows={instruments}
        rowKey={(each) => each.id}
        rowStatus={(each) => (each.due.isOverdue && each.state === "in-use" ? "watch" : undefined)}
        columns={columns(zone)}
        empty={
          <EmptyState title="No instruments yet" actions={add}>
            An instrument is one device by its serial number. Its checks against a standard stand with it, as
            found and as left, so that a reading can be trusted months later.
          </EmptyState>
        }
      />
      {isAdding && (
        <NewInstrumentForm
          onClose={() => setAdding(false)}
          onDone={(text, code) => {
            setAdding(false);
            done(text);
            router.push(`/setup/instruments/${code}`);
          }}
        />
      )}
    </>
  );
}

const columns = (zone: string): DataColumn<InstrumentRow>[] => [
  {
    id: "code",
    head: "Code",
    rowHead: true,
    tight: true,
    cell: (each) => (
      <Link className="link" href={`/setup/instruments/${each.code}`}>
        {each.code}
      </Link>
    ),
  },
  { id: "name", head: "Name", cell: (each) => each.name },
  { id: "serial", head: "Serial", wideOnly: true, cell: (each) => each.serial },
  { id: "state", head: "State", wideOnly: true, cell: (each) => INSTRUMENT_STATE_WORDS[each.state] },
  {
    id: "last",
    head: "Last check",
    wideOnly: true,
    cell: ({ lastCheck }) =>
      lastCheck === null ? (
        "none"
      ) : (
        <>
          <TimeText at={lastCheck.checkedAt} zone={zone} show="day" />:{" "}
          {CHECK_VERDICT_WORDS[lastCheck.verdict]}
        </>
      ),
  },
  { id: "due", head: "Next check", cell: (each) => <DueText instrument={each} /> },
];
