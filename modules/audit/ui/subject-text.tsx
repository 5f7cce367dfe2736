import { type HistoryWords, subjectWord } from "./history-words";
import { RecordHistoryLink } from "./record-history-link";

export interface SubjectTextProps {
  type: string | null;
  id: string | null;
  words: HistoryWords;
}

/** What an entry is about, leading to that record's own history where it is a record. */
export function SubjectText({ type, id, words }: SubjectTextProps) {
  if (type === null) return <span className="text-ink-3">several records or none</span>;
  if (id === null) return <>{subjectWord(type)}</>;
  const table = words.subjects[type];
  const name = (table && words.names[`${table}/${id}`]) ?? id;
  const text = `${subjectWord(type)} ${name}`;
  if (table === undefined) return <span className="break-words">{text}</span>;
  return (
    <RecordHistoryLink table={table} id={id}>
      {text}
    </RecordHistoryLink>
  );
}
