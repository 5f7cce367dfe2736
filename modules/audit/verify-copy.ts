import { spawn } from "node:child_process";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { z } from "zod";
import { MINUTE_MS } from "@/lib/clock";
import { log } from "@/lib/log";
import { SYSTEM_ACTOR } from "@/modules/access";
import { copyDatabase } from "./backup";
import { defineTask } from "./jobs/runner";
import {
  FINDINGS_KEPT,
  recordVerification,
  type VerificationResult,
  verificationResult,
} from "./record-verification";
import { runCommand } from "./run-command";

/** A million entries are checked in well under a minute; what takes longer than this hangs. */
const LONGEST_MS = 30 * MINUTE_MS;

/** The command-line check, which is also what an outsider would run. */
const COMMAND = ["--conditions=react-server", "--import", "tsx", "scripts/history-verify.ts"];

/** Checks a file in a process of its own, so that this one goes on answering. */
function verifyInOtherProcess(file: string): Promise<VerificationResult> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [...COMMAND, file, "--json"], {
      stdio: ["ignore", "pipe", "pipe"],
      timeout: LONGEST_MS,
    });
    let [said, complained] = ["", ""];
    child.stdout.setEncoding("utf8").on("data", (text: string) => (said += text));
    child.stderr.setEncoding("utf8").on("data", (text: string) => (complained += text));
    child.once("error", reject);
    child.once("close", (code) => {
      if (code !== 0 && code !== 1)
        return reject(new Error(`the check ended with ${code}: ${complained.slice(-2000)}`));
      try {
        resolve(shortened(JSON.parse(said) as Checked));
      } catch (cause) {
        reject(new Error("the check gave no answer that can be read", { cause }));
      }
    });
  });
}

type Checked = {
  entries: number;
  head: VerificationResult["head"];
  findings: VerificationResult["findings"];
};

const shortened = ({ entries, head, findings }: Checked): VerificationResult =>
  verificationResult.parse({
    entries,
    head,
    findingCount: findings.length,
    findings: findings.slice(0, FINDINGS_KEPT),
    trouble: null,
  });

const NOT_MADE = { entries: null, head: null, findingCount: null, findings: [] };

/** Copies the database into a folder that is thrown away after, checks the copy, and keeps what was found. */
export const verifyCopyTask = defineTask({
  verb: "verifyCopy",
  lane: "files",
  input: z.strictObject({ verificationId: z.number().int() }),
  async perform({ db, clock }, { verificationId }) {
    const folder = await mkdtemp(path.join(tmpdir(), "stillwell-verify-"));
    let result: VerificationResult;
    try {
      const copy = path.join(folder, "copy.db");
      await copyDatabase(db, copy);
      result = await verifyInOtherProcess(copy);
    } catch (cause) {
      log().error({ err: cause, verificationId }, "the history could not be checked");
      result = { ...NOT_MADE, trouble: cause instanceof Error ? cause.message : String(cause) };
    } finally {
      await rm(folder, { recursive: true, force: true });
    }
    runCommand(db, SYSTEM_ACTOR, recordVerification, { verificationId, ...result }, { clock });
  },
});
