import type { ReactNode } from "react";
import { Panel, TimeText } from "@/lib/ui";
import type { Bounds } from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";
import { type SignatureShown, shortHash } from "@/modules/signoff/model";
import type { OldValue, SheetCounts, SheetGap, SheetLine, SheetState, StruckOut } from "../model";
import { DeviationList } from "./deviation-list";
import { GapList } from "./gap-list";
import { ReviewDecision } from "./review-decision";
import { dayWords, type Names, nameOf, readingsWord } from "./sheet-words";
import { SignatureList } from "./signature-list";
import { SystemTables } from "./system-tables";

export interface DaySheetViewProps {
  area: { id: number; code: string; name: string };
  onDay: string;
  lines: readonly SheetLine[];
  gaps: readonly SheetGap[];
  contentHash: string;
  counts: SheetCounts;
  state: SheetState;
  isOver: boolean;
  hindrances: readonly string[];
  signatures: readonly SignatureShown[];
  bounds: Readonly<Record<number, Bounds>>;
  /** Where a line stands in the round as planned, by reading. */
  places: Readonly<Record<number, number>>;
  oldValues: Readonly<Record<number, OldValue>>;
  struckOut: readonly StruckOut[];
  parameters: readonly FacilityParameter[];
  names: Names;
  zone: string;
  now: number;
  mayReview: boolean;
  mayEnter: boolean;
  /** What stands beside a reading that is off and not explained. */
  besideOff?: ((readingId: number) => ReactNode) | undefined;
}

/** The day sheet: what deviates, what is missing, the decision, then everything that was read. */
export function DaySheetView(props: DaySheetViewProps) {
  const { area, onDay, lines, gaps, contentHash, signatures, struckOut, zone, now } = props;
  return (
    <div className="grid gap-5">
      <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)] print:block">
        <Panel title="What deviates" id="deviates" className="print:border-0">
          <DeviationList {...props} />
          {struckOut.length > 0 && <StruckOutList {...props} />}
        </Panel>
        <div className="grid gap-5">
          {gaps.length > 0 && (
            <Panel title="Not read" id="gaps" aside={`${gaps.length} due`} className="print:border-0">
              <GapList gaps={gaps} now={now} mayEnter={props.mayEnter} />
            </Panel>
          )}
          <Panel title="Signatures" id="signatures" className="print:border-0">
            <SignatureList signatures={signatures} hashNow={contentHash} zone={zone} />
          </Panel>
          {props.mayReview && (
            <Panel title="Your decision" id="decision" className="border-t-2 border-t-ink print:hidden">
              <ReviewDecision
                areaId={area.id}
                areaName={area.name}
                onDay={onDay}
                day={dayWords(onDay)}
                contentHash={contentHash}
                counts={props.counts}
                state={props.state}
                isOver={props.isOver}
                hindrances={props.hindrances}
              />
            </Panel>
          )}
        </div>
      </div>
      <Panel title="What was read" id="read" aside={readingsWord(lines.length)} className="print:border-0">
        {lines.length === 0 ? (
          <p className="text-ink-2">Nothing was read in {area.name} on this day.</p>
        ) : (
          <SystemTables {...props} />
        )}
      </Panel>
      <p className="hidden text-sm print:block">
        {area.name}, {dayWords(onDay)}. Content hash <span className="num">{contentHash}</span> (
        {shortHash(contentHash)}). Printed <TimeText at={now} zone={zone} />.
      </p>
    </div>
  );
}

function StruckOutList({ struckOut, parameters, names, zone }: DaySheetViewProps) {
  return (
    <div className="mt-4">
      <h3 className="mb-2">Struck out</h3>
      <ul className="divide-y divide-rule border-t border-rule">
        {struckOut.map((each) => (
          <li key={each.readingId} className="py-2">
            <b className="font-semibold">
              {each.systemCode} {parameters.find((one) => one.id === each.parameterId)?.name}
            </b>{" "}
            <s className="num decoration-1">
              {each.typedText} {each.typedUnit}
            </s>
            <span className="block text-[0.9375rem] text-ink-2">
              {nameOf(names, each.voidedBy)}
              {each.voidedAt !== null && (
                <>
                  , <TimeText at={each.voidedAt} zone={zone} />
                </>
              )}
              : {each.reason}
            </span>
          </li>
        ))}
      </ul>
    </div>
  );
}
