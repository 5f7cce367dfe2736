import { unitLabel } from "@/lib/units/factors";
import type { Status, WatchRow } from "../model";
import type { TimedValue } from "../rules/change-24h";
import { cellKey } from "./grid-model";
import type { Typed, TypedVerdict } from "./judge-typed";
import type { OutboxItem } from "./outbox";

/** Who took it and when, for everything that is typed while it stands. */
export interface Taken {
  /** UTC epoch milliseconds; null: the moment at which each value is confirmed. */
  readonly at: number | null;
  /** Null: whoever enters it. */
  readonly by: number | null;
}

type Parcel = Pick<OutboxItem, "cell" | "label" | "source" | "reading" | "canonical" | "guessed">;

/** Where a row is, in words: "KELP-01" or "KELP-01, bottom". */
export function placeName({ systemCode, pointName, isDefaultPoint }: WatchRow): string {
  return isDefaultPoint ? systemCode : `${systemCode}, ${pointName.toLowerCase()}`;
}

/** What goes into the outbox for a value that was typed and, where it is off, confirmed. */
export function toParcel(
  row: WatchRow,
  typed: Typed,
  verdict: TypedVerdict,
  how: { source: OutboxItem["source"]; takenBy: number | null; confirmed: boolean; uuid: string },
): Parcel {
  const { parameter } = row;
  const unit = unitLabel(typed.unit);
  const guessed: Status | null = verdict.state === "judged" ? verdict.verdict.status : null;
  return {
    cell: cellKey(row.pointId, parameter.id),
    label: `${placeName(row)}: ${parameter.name} ${typed.text.trim()}${unit === "" ? "" : ` ${unit}`}`,
    source: how.source,
    canonical: verdict.state === "judged" && verdict.value.qualifier === "" ? verdict.value.value : null,
    guessed,
    reading: {
      uuid: how.uuid,
      pointId: row.pointId,
      parameterId: parameter.id,
      typedText: typed.text.trim(),
      typedUnit: parameter.unit === null ? null : typed.unit,
      takenAt: typed.takenAt,
      takenBy: how.takenBy,
      methodId: row.methodId,
      instrumentId: row.instrumentId,
      confirmed: how.confirmed,
    },
  };
}

/** The last thing handed over for a cell; undefined where nothing was. */
export function lastItem(items: readonly OutboxItem[], cell: string): OutboxItem | undefined {
  return items.findLast((each) => each.cell === cell);
}

/** What was handed over for a cell, as readings to compare with; implausible and refused ones are none. */
export function alsoRead(items: readonly OutboxItem[], cell: string): TimedValue[] {
  return items
    .filter((each) => each.cell === cell && each.stage !== "refused" && statusOf(each) !== "implausible")
    .map(({ reading, canonical }) => ({
      id: reading.uuid,
      takenAt: reading.takenAt,
      value: canonical,
      qualifier: "",
    }));
}

/** The server's status where it has answered, else the browser's. */
export function statusOf({ answer, guessed }: OutboxItem): Status | null {
  return answer?.status ?? guessed;
}
