import { execFileSync } from "node:child_process";
import { DAY_MS, MINUTE_MS } from "@/lib/clock";
import { csvLine } from "@/lib/csv";
import { settings } from "@/lib/env";
import { epochToLocal } from "@/lib/zone";
import { receiveUpload, startCommit, withdrawImport } from "@/modules/imports";
import { normal, numbersFor } from "./numbers";
import type { Stage } from "./stage";

/** Magnesium by the laboratory's instrument, one line a day and system, in the form its file has. */
function laboratoryFile(
  stage: Stage,
  systems: readonly string[],
  daysAgo: number,
  days: number,
  shift: number,
): string {
  const next = numbersFor(`laboratory ${systems.join()} ${daysAgo}`);
  const lines = [csvLine(["System", "Parameter", "Value", "Unit", "Date", "Time", "Method", "Note"])];
  for (let day = 0; day < days; day += 1) {
    for (const [index, system] of systems.entries()) {
      const { on, at } = epochToLocal(
        stage.moment(daysAgo, "13:00") + day * DAY_MS + index * 4 * MINUTE_MS,
        settings().STILLWELL_ZONE,
      );
      const value = Math.round(1310 + shift + 14 * normal(next));
      lines.push(csvLine([system, "magnesium", value, "mg/L Mg", on, at, "", ""]));
    }
  }
  return lines.join("");
}

async function bringIn(stage: Stage, name: string, text: string): Promise<number> {
  const deps = { db: stage.db, actor: stage.who("priya"), clock: stage.clock, requestId: null };
  const body = new Blob([text]).stream() as ReadableStream<Uint8Array>;
  const { importId } = await receiveUpload(deps, { name, body, declaredBytes: null });
  await stage.settle();
  stage.act("priya", stage.clock.now() + 6 * MINUTE_MS, startCommit, { importId });
  await stage.settle();
  return importId;
}

/** Files of the laboratory: one that stands, one that was the wrong file and was withdrawn. */
export function seedImports(stage: Stage): void {
  execFileSync(process.execPath, ["scripts/build-reader.mjs"]);
  const coral = ["REEF-01", "REEF-02", "COLD-01"];
  stage.plan(stage.moment(20, "14:10"), async () => {
    await bringIn(stage, "magnesium-november.csv", laboratoryFile(stage, coral, 51, 30, 0));
  });
  stage.plan(stage.moment(9, "15:05"), async () => {
    const text = laboratoryFile(stage, ["REEF-03", "COLD-02"], 19, 9, 95);
    const importId = await bringIn(stage, "magnesium-standards.csv", text);
    const reason = "These are the standards of the run, not the tanks.";
    stage.act("priya", stage.clock.now() + 40 * MINUTE_MS, withdrawImport, { importId, reason });
    await stage.settle();
  });
}
