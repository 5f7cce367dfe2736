/**
 * A stage of the test run answers how many of its checks passed and failed.
 * @typedef {{ passed: number, failed: number, skipped?: number, note?: string }} Counts
 * @typedef {{ name: string, needs?: string[], run: () => Promise<Counts> | Counts }} Stage
 */

/** A stage that only says yes or no counts as one check. */
export const countOne = (status) => (status === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 });

/**
 * Counts of a Vitest run from its JSON report. A file that could not be loaded, a run that ended badly although no test
 * failed, and a run without any test each count as a failure.
 */
export function countVitest(report, status) {
  if (report === undefined) return { passed: 0, failed: 1, note: "it left no report" };
  const passed = report.numPassedTests ?? 0;
  const unloaded = (report.testResults ?? []).filter(
    (file) =>
      file.status === "failed" && (file.assertionResults ?? []).every((test) => test.status !== "failed"),
  ).length;
  const failed = (report.numFailedTests ?? 0) + unloaded;
  const skipped = (report.numPendingTests ?? 0) + (report.numTodoTests ?? 0);
  return settle({ passed, failed, skipped }, status);
}

/** Counts of a Playwright run from its JSON report; a test that passed only at a second try has failed. */
export function countPlaywright(report, status) {
  if (report === undefined) return { passed: 0, failed: 1, note: "it left no report" };
  const { expected = 0, unexpected = 0, flaky = 0, skipped = 0 } = report.stats ?? {};
  return settle({ passed: expected, failed: unexpected + flaky, skipped }, status);
}

function settle(counts, status) {
  if (counts.passed + counts.failed === 0) return { ...counts, failed: 1, note: "it ran no test" };
  if (counts.failed === 0 && status !== 0)
    return { ...counts, failed: 1, note: "it ended badly although no test failed" };
  return counts;
}

/**
 * Runs the stages one after the other, goes on after a failure, and skips (as failed) only what stands on a failed one.
 * @param {Stage[]} stages
 * @param {(line: string) => void} print
 * @returns {Promise<{ passed: number, failed: number }>} the totals; the last line printed is `N passed, N failed`
 */
export async function runStages(stages, print) {
  const broken = new Set();
  const lines = [];
  const total = { passed: 0, failed: 0 };
  for (const { name, needs = [], run } of stages) {
    const missing = needs.filter((need) => broken.has(need));
    print(`\n── ${name}`);
    const counts =
      missing.length > 0
        ? { passed: 0, failed: 1, note: `not run, because ${missing.join(" and ")} failed` }
        : await attempt(run);
    if (counts.failed > 0) broken.add(name);
    total.passed += counts.passed;
    total.failed += counts.failed;
    const skipped = counts.skipped ? `, ${counts.skipped} skipped` : "";
    lines.push(
      `${name}: ${counts.passed} passed, ${counts.failed} failed${skipped}${counts.note ? ` (${counts.note})` : ""}`,
    );
  }
  print("");
  for (const line of lines) print(`  ${line}`);
  print(`${total.passed} passed, ${total.failed} failed`);
  return total;
}

async function attempt(run) {
  try {
    return await run();
  } catch (error) {
    return { passed: 0, failed: 1, note: error instanceof Error ? error.message : String(error) };
  }
}
