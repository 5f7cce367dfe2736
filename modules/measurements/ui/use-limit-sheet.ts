"use client";
import { useCallback, useMemo, useState } from "react";
import type { FacilityParameter } from "@/modules/methods/model";
import { emptyDraft, type LimitDraft, type ReadDraft, readDraft } from "./limit-draft";

/** A row of the sheet: a point and a parameter (a template has no point), as typed, and as it was at the start. */
export interface SheetRow {
  readonly key: string;
  readonly pointId: number | null;
  readonly parameter: FacilityParameter;
  readonly draft: LimitDraft;
  readonly initial: LimitDraft;
}

export interface ReadRow extends SheetRow {
  readonly read: ReadDraft;
  readonly isChanged: boolean;
}

export const sheetKey = (pointId: number | null, parameterId: number) => `${pointId ?? ""}:${parameterId}`;

const sameMeaning = (row: SheetRow, read: ReadDraft, zone: string): boolean => {
  if (row.draft === row.initial) return true;
  const before = readDraft(row.initial, row.parameter, zone);
  return before.ok && read.ok
    ? JSON.stringify([before.shape, before.suspendedReason]) ===
        JSON.stringify([read.shape, read.suspendedReason])
    : JSON.stringify(row.initial) === JSON.stringify(row.draft);
};

/** The rows of a sheet of limits while they are typed, each read and checked at once. */
export function useLimitSheet(start: readonly SheetRow[], zone: string) {
  const [rows, setRows] = useState<readonly SheetRow[]>(start);
  const change = useCallback(
    (key: string, draft: LimitDraft) =>
      setRows((before) => before.map((row) => (row.key === key ? { ...row, draft } : row))),
    [],
  );
  const remove = useCallback(
    (key: string) => setRows((before) => before.filter((row) => row.key !== key)),
    [],
  );
  /** Adds rows; one that is there already takes the new draft. */
  const lay = useCallback(
    (
      added: readonly {
        pointId: number | null;
        parameter: FacilityParameter;
        draft?: LimitDraft;
        initial?: LimitDraft;
      }[],
    ) =>
      setRows((before) => {
        const next = new Map(before.map((row) => [row.key, row]));
        for (const { pointId, parameter, draft, initial } of added) {
          const key = sheetKey(pointId, parameter.id);
          const known = next.get(key);
          const was = known?.initial ?? initial ?? emptyDraft();
          next.set(key, { key, pointId, parameter, initial: was, draft: draft ?? known?.draft ?? was });
        }
        return [...next.values()];
      }),
    [],
  );
  const read = useMemo(
    () =>
      rows.map((row): ReadRow => {
        const answer = readDraft(row.draft, row.parameter, zone);
        return { ...row, read: answer, isChanged: !sameMeaning(row, answer, zone) };
      }),
    [rows, zone],
  );
  return { rows: read, change, remove, lay };
}
