import { eq } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { pointDirectory } from "@/modules/systems";
import type { FileAnswers, FileHeader, FileQuestion, RowDefaults, SystemQuestion } from "./model";
import { fileQuestions, type SurveyResult } from "./rules/file-questions";

type Asked = {
  header: FileHeader;
  survey: SurveyResult | null;
  answers: FileAnswers;
  defaults: RowDefaults;
};

/** What must still be said before the rows can be checked: by the file's own contents, and the system where it names none. */
export function openQuestions(
  db: Orm,
  { header, survey, answers, defaults }: Asked,
): { questions: FileQuestion[]; systemQuestion: SystemQuestion | null } {
  if (survey === null) return { questions: [], systemQuestion: null };
  return {
    questions: fileQuestions(survey, answers),
    systemQuestion: defaults.system === undefined && !namesSystem(header) ? systemQuestion(db) : null,
  };
}

const namesSystem = (header: FileHeader): boolean =>
  header.columnMap.columns.some(({ use }) => use.kind === "field" && use.field === "system");

function systemQuestion(db: Orm): SystemQuestion {
  const places = db
    .select({
      code: pointDirectory.systemCode,
      name: pointDirectory.systemName,
      state: pointDirectory.systemState,
    })
    .from(pointDirectory)
    .where(eq(pointDirectory.isDefaultPoint, true))
    .orderBy(pointDirectory.areaOrder, pointDirectory.systemOrder)
    .all();
  return {
    question: "No column of the file names a system. Of which system are its readings?",
    systems: places.filter((each) => each.state !== "retired").map(({ code, name }) => ({ code, name })),
  };
}

export const isSettled = (open: ReturnType<typeof openQuestions>): boolean =>
  open.questions.length === 0 && open.systemQuestion === null;
