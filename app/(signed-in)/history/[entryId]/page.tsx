import type { Metadata } from "next";
import { historyWords, recordsOfRows, recordsOfSubjects } from "@/app/_server/history-words";
import { askPage } from "@/app/_server/session";
import { Pager } from "@/lib/ui";
import { getEntry } from "@/modules/audit";
import { EntryDetail } from "@/modules/audit/ui/entry-detail";

type Props = {
  params: Promise<{ entryId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Entry ${(await params).entryId}` };
}

const numberOf = (given: string | string[] | undefined): string | undefined =>
  typeof given === "string" && /^\d{1,15}$/.test(given) ? given : undefined;

export default async function EntryPage({ params, searchParams }: Props) {
  const { entryId } = await params;
  const given = await searchParams;
  const all = given.fields === "all";
  const found = await askPage(getEntry, {
    entryId,
    afterChange: numberOf(given.after),
    beforeChange: numberOf(given.before),
  });
  const { entry, changes, hasEarlier, hasLater } = found;
  const words = await historyWords([
    ...recordsOfSubjects([entry]),
    ...recordsOfRows(changes.flatMap(({ before, after }) => [before, after])),
    ...changes.map(({ tableName, rowKey }) => ({ table: tableName, key: rowKey })),
  ]);
  const [first, last] = [changes[0], changes.at(-1)];
  const page = (more: string) => `/history/${entry.id}?${all ? "fields=all&" : ""}${more}`;
  return (
    <>
      <EntryDetail entry={entry} changes={changes} words={words} all={all} />
      <Pager
        newerHref={hasEarlier && first ? page(`before=${first.id}`) : null}
        newerText="Earlier changes"
        olderHref={hasLater && last ? page(`after=${last.id}`) : null}
        olderText="Later changes"
        summary={hasEarlier || hasLater ? `${changes.length} of ${entry.changeCount} changes` : undefined}
      />
    </>
  );
}
