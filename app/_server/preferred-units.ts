import "server-only";
import { cache } from "react";
import { getOwnAccount } from "@/modules/identity";
import {
  parameterInUnit,
  preferredUnit,
  type Qualifier,
  readingInUnit,
  rowInUnit,
  type WatchRow,
} from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";
import { askPage } from "./session";

/** The units that the person who asks prefers, by dimension; asked once a request. */
const preferredUnits = cache(
  async (): Promise<Readonly<Record<string, string>>> =>
    (await askPage(getOwnAccount, {}))?.preferredUnits ?? {},
);

/** Rows of an entry sheet, typed in the person's units; where nothing fits, the watch row's own unit stays. */
export async function rowsToType(rows: readonly WatchRow[]): Promise<WatchRow[]> {
  const preferred = await preferredUnits();
  return rows.map((row) => ({ ...row, unit: preferredUnit(preferred, row.parameter) ?? row.unit }));
}

/** Turns rows into how the person reads them: figures and limits in their units, canonical where nothing fits. */
export async function rowReader(): Promise<(row: WatchRow) => WatchRow> {
  const preferred = await preferredUnits();
  return (row) => rowInUnit(row, preferredUnit(preferred, row.parameter));
}

type Listed = { readonly parameterId: number; readonly value: number | null; readonly qualifier: Qualifier };

/** A list of readings and their parameters as the person reads them. */
export async function readingsToRead<R extends Listed>(
  readings: readonly R[],
  parameters: readonly FacilityParameter[],
): Promise<{ readings: R[]; parameters: FacilityParameter[] }> {
  const preferred = await preferredUnits();
  const units = new Map(parameters.map((each) => [each.id, preferredUnit(preferred, each)]));
  const canonical = new Map(parameters.map((each) => [each.id, each]));
  return {
    parameters: parameters.map((each) => parameterInUnit(each, units.get(each.id) ?? null)),
    readings: readings.map((reading) => {
      const parameter = canonical.get(reading.parameterId);
      return parameter ? readingInUnit(reading, parameter, units.get(parameter.id) ?? null) : reading;
    }),
  };
}
