import { describe, expect, it } from "vitest";
import { countOne, countPlaywright, countVitest, runStages } from "./stages.mjs";

const vitest = (numPassedTests: number, numFailedTests: number, testResults: object[] = []) => ({
  numPassedTests,
  numFailedTests,
  testResults,
});

describe("counting", () => {
  it("a stage that only says yes or no counts as one", () => {
    expect(countOne(0)).toEqual({ passed: 1, failed: 0 });
    expect(countOne(1)).toEqual({ passed: 0, failed: 1 });
    expect(countOne(null)).toEqual({ passed: 0, failed: 1 });
  });

  it("takes passed, failed and skipped from a Vitest report", () => {
    expect(countVitest({ ...vitest(7, 2), numPendingTests: 1 }, 1)).toEqual({
      passed: 7,
      failed: 2,
      skipped: 1,
    });
  });

  it("a test file that does not load is a failure, though no test of it failed", () => {
    const report = vitest(3, 0, [{ status: "failed", assertionResults: [] }]);
    expect(countVitest(report, 1)).toMatchObject({ passed: 3, failed: 1 });
  });

  it("a file with a failed test is not counted twice", () => {
    const report = vitest(3, 1, [{ status: "failed", assertionResults: [{ status: "failed" }] }]);
    expect(countVitest(report, 1)).toMatchObject({ passed: 3, failed: 1 });
  });

  it.each([
    ["Vitest", countVitest(vitest(0, 0), 0)],
    ["Playwright", countPlaywright({ stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 4 } }, 0)],
  ])("a %s stage that ran no test fails", (_name, counts) => {
    expect(counts).toMatchObject({ passed: 0, failed: 1, note: "it ran no test" });
  });

  it("a stage without a report fails", () => {
    expect(countVitest(undefined, 0)).toMatchObject({ failed: 1 });
    expect(countPlaywright(undefined, 0)).toMatchObject({ failed: 1 });
  });

  it("a stage that ends badly fails, though every test passed", () => {
    expect(countVitest(vitest(5, 0), 1)).toMatchObject({ passed: 5, failed: 1 });
    expect(countPlaywright({ stats: { expected: 5 } }, 1)).toMatchObject({ passed: 5, failed: 1 });
  });

  it("a browser test that passed only at a second try has failed", () => {
    expect(countPlaywright({ stats: { expected: 5, flaky: 1 } }, 0)).toMatchObject({ passed: 5, failed: 1 });
  });
});

describe("running stages", () => {
  const run = async (stages: Parameters<typeof runStages>[0]) => {
    const printed: string[] = [];
    const total = await runStages(stages, (line: string) => printed.push(line));
    return { printed, total };
  };

  it("goes on after a failure and ends with one plain line", async () => {
    const { printed, total } = await run([
      { name: "first", run: () => ({ passed: 0, failed: 1 }) },
      { name: "second", run: () => ({ passed: 12, failed: 0 }) },
    ]);
    expect(total).toEqual({ passed: 12, failed: 1 });
    expect(printed.at(-1)).toBe("12 passed, 1 failed");
    expect(printed.filter((line) => /^\d+ passed, \d+ failed$/.test(line))).toHaveLength(1);
  });

  it("does not run what stands on a failed stage, and counts it as failed", async () => {
    let ran = false;
    const { total } = await run([
      { name: "build", run: () => ({ passed: 0, failed: 1 }) },
      {
        name: "browser",
        needs: ["build"],
        run: () => {
          ran = true;
          return { passed: 9, failed: 0 };
        },
      },
    ]);
    expect(ran).toBe(false);
    expect(total).toEqual({ passed: 0, failed: 2 });
  });

  it("a stage that throws has failed, with its sentence", async () => {
    const { printed, total } = await run([
      {
        name: "odd",
        run: () => {
          throw new Error("no browser was found");
        },
      },
    ]);
    expect(total).toEqual({ passed: 0, failed: 1 });
    expect(printed).toContain("  odd: 0 passed, 1 failed (no browser was found)");
  });
});
