import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { historyWords, recordsOfRows } from "@/app/_server/history-words";
import { readMoment } from "@/app/_server/read-moment";
import { pageOfRecord } from "@/app/_server/record-page";
import { askPage, pageActor } from "@/app/_server/session";
import { Pager } from "@/lib/ui";
import { may } from "@/modules/access";
import { auditMay, getRecordAt, getRecordHistory } from "@/modules/audit";
import { tableWord } from "@/modules/audit/ui/field-words";
import { recordHistoryHref } from "@/modules/audit/ui/record-history-link";
import { RecordPage } from "@/modules/audit/ui/record-page";

type Props = {
  params: Promise<{ table: string; key: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

/** The key as the history writes it, out of the address. */
function keyOf(part: string): string {
  try {
    return decodeURIComponent(part);
  } catch {
    notFound();
  }
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `History of a ${tableWord((await params).table)}` };
}

export default async function RecordHistoryPage({ params, searchParams }: Props) {
  const { table, key: part } = await params;
  const key = keyOf(part);
  const given = await searchParams;
  const actor = await pageActor();
  const before =
    typeof given.before === "string" && /^\d{1,15}$/.test(given.before) ? given.before : undefined;
  const { changes, hasOlder } = await askPage(getRecordHistory, { table, key, before });
  const moment = readMoment(typeof given.at === "string" ? given.at : "");
  const then = moment.at === null ? null : await askPage(getRecordAt, { table, key, at: moment.at });
  const rows = changes.flatMap((change) => [change.before, change.after]);
  const words = await historyWords([
    { table, key },
    ...recordsOfRows(rows),
    ...recordsOfRows(then?.row ? [JSON.stringify(then.row)] : []),
  ]);
  const newest = changes[0]?.after ?? changes[0]?.before ?? null;
  const [own, oldest] = [recordHistoryHref(table, key), changes.at(-1)];
  return (
    <RecordPage
      table={table}
      recordKey={key}
      changes={changes}
      words={words}
      then={then && { at: then.at, row: then.row, by: then.entry }}
      momentText={moment.text}
      momentProblem={moment.problem}
      page={pageOfRecord(table, key, newest)}
      mayReadHistory={may(actor, auditMay.readHistory)}
      pager={
        <Pager
          newerHref={before === undefined ? null : own}
          newerText="Newest"
          olderHref={hasOlder && oldest ? `${own}?before=${oldest.id}` : null}
        />
      }
    />
  );
}
