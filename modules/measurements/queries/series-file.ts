import { CSV_BOM, type CsvValue, csvLine } from "@/lib/csv";
import { settings } from "@/lib/env";
import { unitLabel } from "@/lib/units/factors";
import { epochToLocal } from "@/lib/zone";
import { ask, defineQuery, type QueryContext } from "@/modules/audit";
import { listPersonNames } from "@/modules/identity";
import { getParameter, listInstruments, listMethods } from "@/modules/methods";
import { measurementsMay } from "../abilities";
import { STATUS_WORDS } from "../model";
import { listSeriesSlice, SLICE, sliceRows, visiblePoint } from "./series";

/** A slice of the file, and where the next one begins. */
export interface SeriesFileSlice {
  readonly text: string;
  readonly next: { readonly afterAt: number; readonly afterId: number } | null;
}

type Row = ReturnType<typeof sliceRows>[number];
type Column = readonly [head: string, cell: (row: Row) => CsvValue];

const two = (value: number): string => String(value).padStart(2, "0");

/** "2026-07-14 09:42:00+01:00": a spreadsheet reads it, and the doubled hour of autumn stays two moments. */
function localText(at: number, zone: string): string {
  const { on, at: clock, offset } = epochToLocal(at, zone);
  const [hour = "00", minute = "00", second = two(0)] = clock.split(":");
  return `${on} ${hour}:${minute}:${second}${offset}`;
}

function columnsOf(ctx: QueryContext, pointId: number, parameterId: number): Column[] {
  const zone = settings().STILLWELL_ZONE;
  const place = visiblePoint(ctx, pointId);
  const parameter = getParameter(ctx.db, parameterId);
  const people = new Map(ask(ctx, listPersonNames, {}).map(({ id, name }) => [id, name]));
  const methods = new Map(
    ask(ctx, listMethods, { includeRetired: true }).map((each) => [each.id, each.code]),
  );
  const instruments = new Map(
    ask(ctx, listInstruments, { includeRetired: true }).map((each) => [each.id, each.code]),
  );
  const unit = unitLabel(parameter.unit);
  const codeOf = (codes: ReadonlyMap<number, string>, id: number | null) =>
    id === null ? null : codes.get(id);
  return [
    ["system", () => place.systemCode],
    ["point", () => place.pointName],
    ["parameter", () => parameter.code],
    [`taken at (${zone})`, (row) => localText(row.takenAt, zone)],
    ["taken at (UTC)", (row) => new Date(row.takenAt).toISOString()],
    ["qualifier", (row) => row.qualifier],
    [unit === "" ? "value" : `value (${unit})`, (row) => row.value],
    ["answer", (row) => row.answer],
    ["as typed", (row) => row.typedText],
    ["unit as typed", (row) => unitLabel(row.typedUnit)],
    ["status", (row) => STATUS_WORDS[row.status]],
    ["why", (row) => row.sentence],
    ["taken by", (row) => people.get(row.takenBy) ?? `person ${row.takenBy}`],
    ["method", (row) => codeOf(methods, row.methodId)],
    ["instrument", (row) => codeOf(instruments, row.instrumentId)],
    [
      "corrected because",
      (row) => (row.supersedesId === null ? null : (row.correctionReason ?? "corrected")),
    ],
    ["note", (row) => row.note],
  ];
}

/** A series as a CSV file, slice by slice; the first one brings the head. Safe to open: see lib/csv. */
export const listSeriesFileSlice = defineQuery({
  name: "listSeriesFileSlice",
  permission: measurementsMay.read,
  input: listSeriesSlice.input,
  run(ctx, input): SeriesFileSlice {
    const columns = columnsOf(ctx, input.pointId, input.parameterId);
    const rows = sliceRows(ctx, input);
    const last = rows.length < SLICE ? undefined : rows.at(-1);
    const head = input.afterId === undefined ? CSV_BOM + csvLine(columns.map(([name]) => name)) : "";
    const lines = rows.map((row) => csvLine(columns.map(([, cell]) => cell(row))));
    return {
      text: head + lines.join(""),
      next: last ? { afterAt: last.takenAt, afterId: last.id } : null,
    };
  },
});
