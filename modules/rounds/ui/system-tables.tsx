import Link from "next/link";
import { DataTable, Panel, StatusWord, TimeText } from "@/lib/ui";
import type { Bounds } from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";
import type { SheetLine } from "../model";
import { LineStrip, ReadingFigure } from "./reading-figure";
import { type Names, nameOf, readingsWord } from "./sheet-words";

export interface SystemTablesProps {
  lines: readonly SheetLine[];
  parameters: readonly FacilityParameter[];
  bounds: Readonly<Record<number, Bounds>>;
  /** Where a line stands in the round as planned, by reading; what is in no plan comes last. */
  places: Readonly<Record<number, number>>;
  names: Names;
  zone: string;
}

/** What was read, system by system in walking order, each in the order in which it is read. */
export function SystemTables({ lines, ...rest }: SystemTablesProps) {
  const placeOf = ({ readingId }: SheetLine) => rest.places[readingId] ?? Number.MAX_SAFE_INTEGER;
  const walked = lines.toSorted((a, b) => placeOf(a) - placeOf(b));
  const bySystem = new Map<string, SheetLine[]>();
  for (const line of lines) bySystem.set(line.systemCode, []);
  for (const line of walked) bySystem.set(line.systemCode, [...(bySystem.get(line.systemCode) ?? []), line]);
  return (
    <div className="grid gap-6">
      {[...bySystem].map(([code, ofSystem]) => (
        <Panel
          key={code}
          look="open"
          headingLevel={3}
          title={
            <Link href={`/systems/${code}`} className="link">
              {code}
            </Link>
          }
          aside={readingsWord(ofSystem.length)}
        >
          <SystemTable code={code} lines={ofSystem} {...rest} />
        </Panel>
      ))}
    </div>
  );
}

const rowStatus = ({ status }: SheetLine) =>
  status === "watch" || status === "out" || status === "implausible" ? status : undefined;

function SystemTable(props: Omit<SystemTablesProps, "places"> & { code: string }) {
  const { code, lines, parameters, bounds, names, zone } = props;
  const of = (line: SheetLine) => parameters.find((each) => each.id === line.parameterId);
  const hasPoints = new Set(lines.map((line) => line.pointCode)).size > 1;
  return (
    <DataTable
      caption={`Readings of ${code}`}
      className="xl:[&_table]:table-fixed"
      rows={lines}
      rowKey={(line) => line.readingId}
      rowStatus={rowStatus}
      columns={[
        {
          id: "parameter",
          head: "Parameter",
          rowHead: true,
          cell: (line) => (
            <>
              <Link href={`/readings/${line.readingId}`} className="link inline-block min-h-6">
                {of(line)?.name ?? line.parameterCode}
                {hasPoints && <span className="font-normal">, {line.pointCode.toLowerCase()}</span>}
              </Link>
              <span className="block font-normal sm:hidden">
                <LineStatus line={line} /> · <Taken line={line} names={names} zone={zone} />
              </span>
            </>
          ),
        },
        {
          id: "value",
          head: "Value",
          numeric: true,
          cell: (line) => {
            const parameter = of(line);
            return parameter ? <ReadingFigure reading={line} parameter={parameter} /> : line.typedText;
          },
        },
        {
          id: "strip",
          head: "Limits",
          wideOnly: true,
          tight: true,
          cell: (line) => {
            const parameter = of(line);
            if (!parameter) return null;
            const limits = bounds[line.readingId];
            return (
              <LineStrip
                value={line.qualifier === "" ? line.value : null}
                status={line.status}
                bounds={limits}
                parameter={parameter}
              />
            );
          },
        },
        {
          id: "status",
          head: "Status",
          wideOnly: true,
          cell: (line) => <LineStatus line={line} />,
        },
        {
          id: "who",
          head: "Taken",
          wideOnly: true,
          cell: (line) => <Taken line={line} names={names} zone={zone} />,
        },
      ]}
    />
  );
}

function LineStatus({ line }: { line: SheetLine }) {
  return (
    <StatusWord
      status={line.status}
      direction={line.side === "low" || line.side === "high" ? line.side : null}
    />
  );
}

function Taken({ line, names, zone }: { line: SheetLine; names: Names; zone: string }) {
  return (
    <span className="text-sm text-ink-2">
      <TimeText at={line.takenAt} zone={zone} show="time" /> {nameOf(names, line.takenBy)}
    </span>
  );
}
