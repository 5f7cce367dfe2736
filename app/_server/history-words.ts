import "server-only";
import { settings } from "@/lib/env";
import { may } from "@/modules/access";
import { nameRecords } from "@/modules/audit";
import type { HistoryWords } from "@/modules/audit/ui/history-words";
import { identityMay, listPersonNames } from "@/modules/identity";
import { SAID_OF_VERB } from "./all-events";
import { REFERENCE_TABLES, SUBJECT_TABLES } from "./history-words.data";
import { askPage, pageActor } from "./session";

type RecordKey = { table: string; key: string };
type Subject = { subjectType: string | null; subjectId: string | null };

/** The records that a page's entries are about. */
export const recordsOfSubjects = (entries: readonly Subject[]): RecordKey[] =>
  entries.flatMap(({ subjectType, subjectId }) => {
    const table = subjectType === null ? undefined : SUBJECT_TABLES[subjectType];
    return table === undefined || subjectId === null ? [] : [{ table, key: subjectId }];
  });

/** The records that rows (as JSON) point to. */
export const recordsOfRows = (rows: readonly (string | null)[]): RecordKey[] =>
  rows.flatMap((json) => {
    if (json === null) return [];
    return Object.entries(JSON.parse(json) as Record<string, unknown>).flatMap(([column, value]) => {
      const table = REFERENCE_TABLES[column];
      return table === undefined || typeof value !== "number" ? [] : [{ table, key: String(value) }];
    });
  });

const MOST_NAMED = 2000;

/** What a page of the history needs to put numbers into words. */
export async function historyWords(records: readonly RecordKey[]): Promise<HistoryWords> {
  const people = may(await pageActor(), identityMay.listPeople) ? await askPage(listPersonNames, {}) : [];
  const wanted = new Map(records.map((record) => [`${record.table}/${record.key}`, record]));
  return {
    zone: settings().STILLWELL_ZONE,
    people: Object.fromEntries(people.map(({ id, name }) => [id, name])),
    names: await askPage(nameRecords, { records: [...wanted.values()].slice(0, MOST_NAMED) }),
    references: REFERENCE_TABLES,
    subjects: SUBJECT_TABLES,
    said: SAID_OF_VERB,
  };
}
