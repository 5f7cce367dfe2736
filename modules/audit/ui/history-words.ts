/** What the history's pages need to put numbers into words; made by the app, which knows every module. */
export type HistoryWords = {
  /** The facility's zone. */
  zone: string;
  people: Readonly<Record<number, string>>;
  /** Names of records by `table/key`. */
  names: Readonly<Record<string, string>>;
  /** Column → the table whose record its number names. */
  references: Readonly<Record<string, string>>;
  /** Kind of subject → its table. */
  subjects: Readonly<Record<string, string>>;
  /** Verb → what was done: "corrected a reading". */
  said: Readonly<Record<string, string>>;
};

type Acted = { actorKind: string; actorId: number | null };

/** Who did it, by name; the product itself where no person did. */
export function actorName(words: HistoryWords, { actorKind, actorId }: Acted): string {
  if (actorKind !== "person" || actorId === null) return "Stillwell";
  return words.people[actorId] ?? `person ${actorId}`;
}

/** What was done, in words; a verb that no part of the product knows any more stands for itself. */
export const saidOf = (words: HistoryWords, verb: string): string => words.said[verb] ?? verb;

/** "limit-workbook" is a "limit workbook". */
export const subjectWord = (type: string): string => type.replaceAll("-", " ");
