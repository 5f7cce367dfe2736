"use client";
import type { ReactNode } from "react";
import type { FieldProblem } from "@/lib/problem";
import type { DraftKind, LimitDraft } from "./limit-draft";
import { LimitRowFields, SheetHead } from "./limit-row-fields";
import type { ReadRow } from "./use-limit-sheet";

export interface LimitSheetProps {
  rows: readonly ReadRow[];
  nameOf: (row: ReadRow) => string;
  titleOf: (row: ReadRow) => ReactNode;
  kinds: readonly DraftKind[];
  /** True once somebody tried to send: untouched rows say what is wrong as well. */
  showAll: boolean;
  /** What the server said about rows, by key. */
  refused: ReadonlyMap<string, readonly FieldProblem[]>;
  onChange: (key: string, draft: LimitDraft) => void;
  onRemove: (key: string) => void;
}

/** A sheet of limits: a row for each point and parameter. */
export function LimitSheet({
  rows,
  nameOf,
  titleOf,
  kinds,
  showAll,
  refused,
  onChange,
  onRemove,
}: LimitSheetProps) {
  return (
    <div>
      <SheetHead />
      <div className="divide-y divide-rule">
        {rows.map((row) => {
          const own = row.read.ok || !(row.isChanged || showAll) ? [] : row.read.problems;
          const said = row.read.ok ? (refused.get(row.key) ?? []) : [];
          return (
            <LimitRowFields
              key={row.key}
              name={nameOf(row)}
              title={titleOf(row)}
              parameter={row.parameter}
              draft={row.draft}
              kinds={kinds}
              problems={[...own, ...said.map(({ detail }) => ({ knot: 0, fields: [], sentence: detail }))]}
              onChange={(draft) => onChange(row.key, draft)}
              onRemove={() => onRemove(row.key)}
            />
          );
        })}
      </div>
    </div>
  );
}
