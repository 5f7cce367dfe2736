import { existsSync, readFileSync } from "node:fs";
import { parseArgs } from "node:util";
import { verifyFile } from "@/modules/audit";

const USAGE = "npm run history:verify -- FILE [--checkpoint NUMBER:HASH …] [--checkpoints FILE] [--json]";
const CHECKPOINT = /(\d+)\s*[: ]\s*([0-9a-f]{64})/g;

/** Checkpoints from the command line and from a saved mail or text: every `NUMBER:HASH` in it. */
function readCheckpoints(given: string[], file: string | undefined): { entryId: number; hash: string }[] {
  const text = [...given, file ? readFileSync(file, "utf8") : ""].join("\n");
  return [...text.matchAll(CHECKPOINT)].map(([, entryId, hash]) => ({
    entryId: Number(entryId),
    hash: String(hash),
  }));
}

/** `npm run history:verify -- FILE`: checks a copy of the database file alone. Exit 1 where something is wrong. */
function main(): number {
  const { positionals, values } = parseArgs({
    allowPositionals: true,
    options: {
      checkpoint: { type: "string", multiple: true, default: [] },
      checkpoints: { type: "string" },
      json: { type: "boolean", default: false },
    },
  });
  const [file] = positionals;
  if (!file || !existsSync(file)) {
    console.error(file ? `There is no file ${file}.` : `Say which file: ${USAGE}`);
    return 2;
  }
  const result = verifyFile(file, readCheckpoints(values.checkpoint, values.checkpoints));
  if (values.json) {
    console.log(JSON.stringify(result));
    return result.findings.length === 0 ? 0 : 1;
  }
  console.log(
    `${result.entries} entries, newest ${result.head ? `${result.head.entryId}:${result.head.hash}` : "none"}`,
  );
  console.log(
    result.checkpoints > 0
      ? `compared with ${result.checkpoints} checkpoints that left the machine`
      : "no checkpoint given: a tail that was cut off cannot be found without one",
  );
  for (const finding of result.findings.slice(0, 50)) console.log(`WRONG  ${finding.sentence}`);
  if (result.findings.length > 50) console.log(`… and ${result.findings.length - 50} more`);
  console.log(
    result.findings.length === 0 ? "The history is whole." : `First altered: ${result.findings[0]?.sentence}`,
  );
  return result.findings.length === 0 ? 0 : 1;
}

process.exitCode = main();
