import type { Metadata } from "next";
import { EVENT_TABLES, saidOf } from "@/app/_server/all-events";
import { readHistorySearch, searchOf, searchParamsOf } from "@/app/_server/history-search";
import { historyWords, recordsOfSubjects } from "@/app/_server/history-words";
import { askPage, pageActor } from "@/app/_server/session";
import { LinkButton, Notice, PageHead, Pager, type SelectGroup } from "@/lib/ui";
import { may } from "@/modules/access";
import { auditMay, listEntries, listSubjectTypes, listVerbs } from "@/modules/audit";
import { EntriesTable } from "@/modules/audit/ui/entries-table";
import { HistoryFilters } from "@/modules/audit/ui/history-filters";
import { subjectWord } from "@/modules/audit/ui/history-words";
import { listPersonNames } from "@/modules/identity";

export const metadata: Metadata = { title: "History" };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

/** The actions that occur, in words, under the parts of the product they belong to. */
function actionGroups(verbs: readonly string[]): SelectGroup[] {
  const occurs = new Set(verbs);
  return EVENT_TABLES.map(({ title, events }) => ({
    label: title,
    options: Object.values(events)
      .filter(({ verb }) => occurs.has(verb))
      .map(({ verb }) => ({ value: verb, label: saidOf(verb) })),
  })).filter((group) => group.options.length > 0);
}

const numberOf = (given: string | string[] | undefined): string | undefined =>
  typeof given === "string" && /^\d{1,15}$/.test(given) ? given : undefined;

export default async function HistoryPage({ searchParams }: Props) {
  const given = await searchParams;
  const search = searchOf(given);
  const { filter, problems } = readHistorySearch(search);
  const [before, after] = [numberOf(given.before), numberOf(given.after)];
  const { entries, hasMore } = await askPage(listEntries, { ...filter, before, after });
  const actor = await pageActor();
  const words = await historyWords(recordsOfSubjects(entries));
  const people = await askPage(listPersonNames, {});
  const [first, last] = [entries[0], entries.at(-1)];
  const hasNewer = after === undefined ? before !== undefined : hasMore;
  const hasOlder = after === undefined ? hasMore : true;
  const page = (more: Record<string, string | undefined>) => `/history${searchParamsOf(search, more)}`;
  return (
    <>
      <PageHead
        title="History"
        facts="Every change there ever was, newest first: who, when, what, and why. Nothing here can be edited."
        actions={
          <>
            {may(actor, auditMay.verify) && (
              <LinkButton href="/history/verification" size="small">
                Is it whole?
              </LinkButton>
            )}
            <LinkButton
              href={`/api/v1/history/csv${searchParamsOf(search)}`}
              size="small"
              prefetch={false}
              download
            >
              Save as CSV
            </LinkButton>
          </>
        }
      />
      <HistoryFilters
        key={searchParamsOf(search)}
        search={search}
        people={people}
        actions={actionGroups(await askPage(listVerbs, {}))}
        subjects={(await askPage(listSubjectTypes, {})).map((type) => ({
          value: type,
          label: subjectWord(type),
        }))}
      />
      {problems.length > 0 && (
        <div className="mb-4">
          <Notice kind="caution" title="Part of the search was left out">
            {problems.map((problem) => (
              <p key={problem}>{problem}</p>
            ))}
          </Notice>
        </div>
      )}
      <EntriesTable entries={entries} words={words} searched={searchParamsOf(search) !== ""} />
      <Pager
        newerHref={hasNewer && first ? page({ after: String(first.id) }) : null}
        olderHref={hasOlder && last ? page({ before: String(last.id) }) : null}
        summary={first && last ? `Entries ${first.id} to ${last.id}` : undefined}
      />
    </>
  );
}
