import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { expect } from "vitest";
import type { CandidateReading, FileRefusal, RawRow, RowProblem } from "@/modules/imports/model";
import type { ReaderRequest } from "@/modules/imports/reader/messages";
import { ReadingSession } from "@/modules/imports/reader/reading-session";
import { RefusedFile } from "@/modules/imports/rules/refused-file";

/** A folder for files to import, and the reading of one in the test's own process. */
export class ImportFolder {
  #folder = "";

  async make(): Promise<void> {
    this.#folder = await mkdtemp(path.join(tmpdir(), "import-files-"));
  }

  async remove(): Promise<void> {
    await rm(this.#folder, { recursive: true });
  }

  request(name: string, more: Partial<ReaderRequest> = {}): ReaderRequest {
    return {
      path: path.join(this.#folder, name),
      name,
      mode: "rows",
      zone: "UTC",
      parameters: [{ code: "PH", names: ["pH"] }],
      defaults: {},
      answers: {},
      ...more,
    };
  }

  /** Writes a file and reads it from end to end. */
  async read(name: string, bytes: Buffer | string, more: Partial<ReaderRequest> = {}) {
    const wanted = this.request(name, more);
    await writeFile(wanted.path, bytes);
    const session = await ReadingSession.open(wanted);
    const rows: RawRow[] = [];
    const candidates: CandidateReading[] = [];
    const problems: RowProblem[] = [];
    for (let batch = await session.next(); batch; batch = await session.next()) {
      rows.push(...batch.rows);
      candidates.push(...batch.candidates);
      problems.push(...batch.problems);
    }
    return { header: session.header, rows, candidates, problems, end: session.end() };
  }

  /** Why a file is not read; fails when it is. Every refusal says what is wrong and how to mend it. */
  async refusal(
    name: string,
    bytes: Buffer | string,
    more: Partial<ReaderRequest> = {},
  ): Promise<FileRefusal> {
    try {
      await this.read(name, bytes, more);
    } catch (error) {
      if (!(error instanceof RefusedFile)) throw error;
      expect(error.refusal.reason).toMatch(/\.$/);
      expect(error.refusal.mend).toMatch(/\.$/);
      return error.refusal;
    }
    throw new Error(`${name} was not refused`);
  }
}
