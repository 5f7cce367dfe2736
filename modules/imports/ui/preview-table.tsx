"use client";
import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import {
  Button,
  type DataColumn,
  DataTable,
  fetchJson,
  RadioButtons,
  Skeleton,
  type StatusCode,
  StatusWord,
} from "@/lib/ui";
import type { ImportDetail, StagedPage, StagedRowView } from "../model";
import { OUTCOME_WORDS, REMARK_WORDS } from "./import-words";

type Filter = "all" | "accepted" | "off" | "duplicate" | "refused";
const PAGE = 50;
const number = (value: number) => value.toLocaleString("en-GB");

const columns: DataColumn<StagedRowView>[] = [
  {
    id: "line",
    head: "Line",
    tight: true,
    cell: (row) => (
      <>
        <span className="num">{row.line}</span>
        {row.columnName !== null && (
          <span className="block text-sm text-ink-3 max-sm:hidden">{row.columnName}</span>
        )}
      </>
    ),
  },
  {
    id: "reading",
    head: "Reading",
    rowHead: true,
    cell: ({ texts }) => (
      <>
        {[texts.system, texts.point].filter((each) => each !== "").join(", ") || "no system"}
        <span className="block font-normal text-ink-2">{texts.parameter || "no parameter"}</span>
        <span className="block text-sm font-normal text-ink-3">{texts.takenAt || "no time"}</span>
      </>
    ),
  },
  {
    id: "value",
    head: "Value",
    numeric: true,
    cell: ({ texts }) => (
      <>
        {texts.value || "–"}
        {texts.unit !== "" && <span className="unit"> {texts.unit}</span>}
      </>
    ),
  },
  { id: "found", head: "What comes of it", cell: (row) => <Found row={row} /> },
];

function Found({ row }: { row: StagedRowView }) {
  if (row.outcome !== "accepted") {
    return (
      <div className="min-w-56">
        <span className={row.outcome === "refused" ? "font-semibold text-out" : "font-semibold"}>
          {OUTCOME_WORDS[row.outcome]}
        </span>
        {row.problems.map((each) => (
          <p key={each.code + each.reason} className="mt-0.5">
            {each.columnName !== null && <b className="font-semibold">{each.columnName}: </b>}
            {each.reason} <span className="text-ink-2">{each.mend}</span>
          </p>
        ))}
      </div>
    );
  }
  const status = (row.expectedStatus ?? "none") as StatusCode;
  return (
    <div className="min-w-44">
      accepted, <StatusWord status={status} />
      {status !== "within" && status !== "none" && (
        <p className="text-sm text-ink-2">{row.expectedSentence}</p>
      )}
      {row.remarks.length > 0 && (
        <p className="text-sm text-ink-3">{row.remarks.map((each) => REMARK_WORDS[each]).join("; ")}</p>
      )}
    </div>
  );
}

function queryOf(filter: Filter, after: number): string {
  const search = new URLSearchParams({ limit: String(PAGE), after: String(after) });
  if (filter === "off") search.set("off", "1");
  search.set("outcome", filter === "off" ? "accepted" : filter);
  return search.toString();
}

/** The readings that a file offers, by what comes of them, a page at a time. */
export function PreviewTable({ detail }: { detail: ImportDetail }) {
  const off = (detail.statusCounts?.out ?? 0) + (detail.statusCounts?.implausible ?? 0);
  const [filter, setFilter] = useState<Filter>((detail.refusedCount ?? 0) > 0 ? "refused" : "all");
  const [trail, setTrail] = useState<number[]>([0]);
  const after = trail.at(-1) ?? 0;
  const { data, error } = useQuery({
    queryKey: ["staged-rows", detail.id, detail.checkedAt, detail.state, filter, after],
    queryFn: ({ signal }) =>
      fetchJson<{ data: StagedPage }>(`/api/v1/imports/${detail.id}/rows?${queryOf(filter, after)}`, signal),
  });
  const page = data?.data;
  const choose = (next: Filter) => {
    setFilter(next);
    setTrail([0]);
  };
  const total = (detail.acceptedCount ?? 0) + (detail.duplicateCount ?? 0) + (detail.refusedCount ?? 0);
  return (
    <div className="grid gap-4">
      <RadioButtons
        name="outcome"
        label="Which readings are shown"
        value={filter}
        onChange={(event) => choose(event.target.value as Filter)}
        options={[
          { value: "all", label: `All (${number(total)})` },
          { value: "accepted", label: `Accepted (${number(detail.acceptedCount ?? 0)})` },
          { value: "off", label: `Out or implausible (${number(off)})` },
          { value: "duplicate", label: `Duplicate (${number(detail.duplicateCount ?? 0)})` },
          { value: "refused", label: `Refused (${number(detail.refusedCount ?? 0)})` },
        ]}
      />
      {error && <p className="font-semibold text-out">{error.message}</p>}
      {!page && !error && <Skeleton label="The readings are being fetched" />}
      {page && (
        <>
          <DataTable
            caption="Readings of the file"
            columns={columns}
            rows={page.rows}
            rowKey={(row) => row.id}
            rowStatus={(row) =>
              row.outcome === "refused"
                ? "out"
                : row.expectedStatus === "watch" ||
                    row.expectedStatus === "out" ||
                    row.expectedStatus === "implausible"
                  ? row.expectedStatus
                  : undefined
            }
            empty={<p className="text-ink-2">There are none of this kind.</p>}
          />
          <div className="flex flex-wrap gap-2.5">
            {trail.length > 1 && (
              <Button size="small" onClick={() => setTrail(trail.slice(0, -1))}>
                Earlier lines
              </Button>
            )}
            {page.next !== null && (
              <Button size="small" onClick={() => setTrail([...trail, page.next ?? 0])}>
                Later lines
              </Button>
            )}
          </div>
        </>
      )}
    </div>
  );
}
