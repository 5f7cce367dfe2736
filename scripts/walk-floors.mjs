import { existsSync } from "node:fs";
import path from "node:path";
import { cruise } from "dependency-cruiser";
import { WALKS } from "../floors.config.mjs";

const FOLDERS = ["app", "modules", "db", "lib", "scripts"];

/**
 * Walks a project's imports and lists every breach of the floors.
 * @param {string} root folder that holds app/, modules/, db/ and lib/; `@/` means this folder
 * @returns {Promise<{ files: number, breaches: { rule: string, from: string, to: string, via: string[] }[] }>}
 */
export async function walkFloors(root) {
  const folders = FOLDERS.filter((folder) => existsSync(path.join(root, folder)));
  const breaches = [];
  let files = 0;
  for (const { forbidden, options } of WALKS) {
    const { output } = await cruise(
      folders,
      { ...options, baseDir: root, validate: true, ruleSet: { forbidden } },
      { alias: { "@": path.resolve(root) } },
    );
    files = Math.max(
      files,
      output.modules.filter(({ source }) => /^(app|modules|db|lib|scripts)\//.test(source)).length,
    );
    for (const { rule, from, to, cycle, via } of output.summary.violations) {
      breaches.push({ rule: rule.name, from, to, via: (cycle ?? via ?? []).map((step) => step.name) });
    }
  }
  return { files, breaches };
}
