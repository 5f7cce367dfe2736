import { formatDay, formatLocal } from "@/lib/zone";
import { prettyJson, valueKind } from "./field-words";
import type { HistoryWords } from "./history-words";
import { RecordHistoryLink } from "./record-history-link";

export interface ValueTextProps {
  name: string;
  value: unknown;
  words: HistoryWords;
}

/** One value of a row as a person reads it; what the column holds itself stands in the title. */
export function ValueText({ name, value, words }: ValueTextProps) {
  const raw = typeof value === "object" ? undefined : String(value);
  switch (valueKind(name, value)) {
    case "nothing":
      return <span className="text-ink-3">empty</span>;
    case "moment":
      return <span title={raw}>{formatLocal(Number(value), words.zone, "second")}</span>;
    case "day":
      return <span title={raw}>{formatDay(String(value))}</span>;
    case "person":
      return <span title={raw}>{words.people[Number(value)] ?? `person ${String(value)}`}</span>;
    case "yes-no":
      return <span title={raw}>{value === 0 ? "no" : "yes"}</span>;
    case "reference":
      return <ReferenceText name={name} value={String(value)} words={words} />;
    case "data":
      return (
        <pre className="max-w-full font-mono text-sm whitespace-pre-wrap [overflow-wrap:anywhere]">
          {prettyJson(value)}
        </pre>
      );
    case "plain":
      return (
        <span className="[overflow-wrap:anywhere]">{value === "" ? "“” (no text)" : String(value)}</span>
      );
  }
}

function ReferenceText({ name, value, words }: { name: string; value: string; words: HistoryWords }) {
  const table = words.references[name];
  if (table === undefined) return <>{value}</>;
  const known = words.names[`${table}/${value}`];
  return (
    <RecordHistoryLink table={table} id={value}>
      {known === undefined ? value : `${known} (${value})`}
    </RecordHistoryLink>
  );
}
