import { eq } from "drizzle-orm";
import { z } from "zod";
import { Problem } from "@/lib/problem";
import { type CommandContext, defineCommand } from "@/modules/audit";
import { withdrawDelivery } from "@/modules/measurements";
import { importsMay } from "../abilities";
import { importsEvents } from "../events";
import { answerQuestionsInput, importIdInput } from "../input";
import type { FileHeader, StatusCounts } from "../model";
import { isSettled, openQuestions } from "../questions";
import { getImportIn, getImportRecord, type ImportRecord } from "../records";
import type { SurveyResult } from "../rules/file-questions";
import { imports } from "../schema";
import { CHECK_IMPORT } from "../work";

type Change = Partial<typeof imports.$inferInsert>;

const change = (ctx: CommandContext, of: ImportRecord, to: Change): void => {
  ctx.db.update(imports).set(to).where(eq(imports.id, of.id)).run();
};

const subject = (of: ImportRecord) => ({ type: "import", id: of.id });

/** What has to be forgotten when rows are checked anew. */
const UNCHECKED: Change = {
  acceptedCount: null,
  duplicateCount: null,
  refusedCount: null,
  statusCounts: null,
  checkedAt: null,
  problem: null,
};

/** Keeps what a pass over the whole file showed; asks a person where it leaves something open. */
export const recordSurvey = defineCommand({
  verb: "recordSurvey",
  permission: importsMay.work,
  input: importIdInput.extend({ header: z.custom<FileHeader>(), survey: z.custom<SurveyResult>() }),
  run(ctx, { importId, header, survey }) {
    const row = getImportIn(ctx.db, importId, ["uploaded"]);
    const isClear = isSettled(openQuestions(ctx.db, { ...row, header, survey }));
    const state = isClear ? "checking" : "questions";
    const checkRun = row.checkRun + (isClear ? 1 : 0);
    change(ctx, row, { header, survey, form: header.columnMap.form, state, checkRun });
    return {
      result: { state },
      event: {
        kind: importsEvents.surveyed,
        subject: subject(row),
        payload: { rows: survey.rows, asks: !isClear },
      },
    };
  },
});

/** Says how a file is to be read. Once nothing is open its rows are checked; another worksheet is looked through first. */
export const answerQuestions = defineCommand({
  verb: "answerQuestions",
  permission: importsMay.upload,
  input: answerQuestionsInput,
  areas: () => [],
  run(ctx, { importId, system, sheet, ...said }) {
    const row = getImportIn(ctx.db, importId, ["questions", "checked", "failed"]);
    const answers = { ...row.answers, ...said };
    const defaults = { ...row.defaults, ...(system ? { system } : {}) };
    const isOtherSheet = sheet !== undefined && sheet !== row.header.sheet;
    if (isOtherSheet && !row.header.sheets.includes(sheet)) {
      throw new Problem("invalid", `The workbook has no worksheet “${sheet}”.`, [
        { pointer: "/sheet", code: "no-such-sheet", detail: "Choose one of the worksheets shown." },
      ]);
    }
    const looksAgain = isOtherSheet || row.survey === null;
    const isClear = !looksAgain && isSettled(openQuestions(ctx.db, { ...row, answers, defaults }));
    const state = looksAgain ? "uploaded" : isClear ? "checking" : "questions";
    change(ctx, row, {
      ...UNCHECKED,
      answers,
      defaults,
      state,
      ...(isOtherSheet ? { sheet, survey: null } : {}),
      ...(isClear ? { checkRun: row.checkRun + 1 } : {}),
    });
    if (state !== "questions") ctx.enqueue(CHECK_IMPORT, { importId });
    return {
      result: { importId, state },
      event: { kind: importsEvents.answered, subject: subject(row), payload: { ...said, system, sheet } },
    };
  },
});

/** Checks the rows of a file once more, after something was mended under Setup or a fault. */
export const startCheck = defineCommand({
  verb: "startCheck",
  permission: importsMay.upload,
  input: importIdInput,
  areas: () => [],
  run(ctx, { importId }) {
    const row = getImportIn(ctx.db, importId, ["checked", "failed"]);
    const open = openQuestions(ctx.db, row);
    const state = row.survey === null ? "uploaded" : isSettled(open) ? "checking" : "questions";
    const checkRun = row.checkRun + (state === "checking" ? 1 : 0);
    change(ctx, row, { ...UNCHECKED, state, checkRun });
    if (state !== "questions") ctx.enqueue(CHECK_IMPORT, { importId });
    return {
      result: { importId, state },
      event: { kind: importsEvents.checkStarted, subject: subject(row), payload: { code: row.code } },
    };
  },
});

/** Keeps what the check of all rows came to. */
export const recordCheck = defineCommand({
  verb: "recordCheck",
  permission: importsMay.work,
  input: importIdInput.extend({
    checkRun: z.number().int(),
    accepted: z.number().int(),
    duplicate: z.number().int(),
    refused: z.number().int(),
    statusCounts: z.custom<StatusCounts>(),
  }),
  run(ctx, { importId, checkRun, accepted, duplicate, refused, statusCounts }) {
    const row = getImportIn(ctx.db, importId, ["checking"]);
    if (row.checkRun !== checkRun) throw new Problem("conflict", "The rows are being checked anew.");
    change(ctx, row, {
      state: "checked",
      acceptedCount: accepted,
      duplicateCount: duplicate,
      refusedCount: refused,
      statusCounts,
      checkedAt: ctx.at,
    });
    return {
      result: { importId },
      event: {
        kind: importsEvents.checked,
        subject: subject(row),
        payload: { accepted, duplicate, refused },
      },
    };
  },
});

/** Keeps why an import could not go on; nothing of it becomes visible. */
export const failImport = defineCommand({
  verb: "failImport",
  permission: importsMay.work,
  input: importIdInput.extend({ problem: z.string().min(1).max(2000) }),
  run(ctx, { importId, problem }) {
    const row = getImportIn(ctx.db, importId, ["uploaded", "checking", "committing"]);
    if (row.deliveryId !== null) {
      withdrawDelivery.run(ctx, { deliveryId: row.deliveryId, reason: "The import could not go on." });
    }
    change(ctx, row, { state: "failed", problem, deliveryId: null });
    return {
      result: { importId },
      event: {
        kind: importsEvents.failed,
        subject: subject(row),
        payload: { was: row.state },
        reason: problem,
      },
    };
  },
});

/** Lays an import aside before it is committed; the file and what was found stay readable. */
export const discardImport = defineCommand({
  verb: "discardImport",
  permission: importsMay.upload,
  input: importIdInput,
  areas: () => [],
  run(ctx, { importId }) {
    const row = getImportRecord(ctx.db, importId);
    if (!["uploaded", "questions", "checking", "checked", "failed"].includes(row.state)) {
      throw new Problem(
        "conflict",
        `Import ${row.code} has been committed or laid aside. What is committed can be withdrawn.`,
      );
    }
    change(ctx, row, { state: "discarded" });
    return {
      result: { importId },
      event: { kind: importsEvents.discarded, subject: subject(row), payload: { was: row.state } },
    };
  },
});
