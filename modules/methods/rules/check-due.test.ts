import { describe, expect, it } from "vitest";
import { checkDue } from "./check-due";

const good = (on: string) => ({ on, verdict: "good" as const });

describe("the due date of a check", () => {
  it("lies the interval after the last good check, over the ends of months and leap days", () => {
    // The Gregorian calendar: 2024 is a leap year, 2026 is not.
    expect(checkDue({ checkEveryDays: 30, last: good("2024-01-31") }, "2024-02-01").dueOn).toBe("2024-03-01");
    expect(checkDue({ checkEveryDays: 30, last: good("2026-01-31") }, "2026-02-01").dueOn).toBe("2026-03-02");
  });

  it("is not overdue on the day itself and overdue on the day after", () => {
    const facts = { checkEveryDays: 7, last: good("2026-03-02") };
    expect(checkDue(facts, "2026-03-09")).toEqual({ state: "due", dueOn: "2026-03-09", isOverdue: false });
    expect(checkDue(facts, "2026-03-10")).toEqual({ state: "overdue", dueOn: "2026-03-09", isOverdue: true });
  });

  it("counts an adjusted check as good and a failed one as overdue at once", () => {
    const on = "2026-03-02";
    expect(checkDue({ checkEveryDays: 7, last: { on, verdict: "adjusted" } }, on).isOverdue).toBe(false);
    expect(checkDue({ checkEveryDays: 7, last: { on, verdict: "failed" } }, on)).toEqual({
      state: "failed",
      dueOn: on,
      isOverdue: true,
    });
    expect(checkDue({ checkEveryDays: null, last: { on, verdict: "failed" } }, on).isOverdue).toBe(true);
  });

  it("asks for nothing without an interval, and for a first check with one", () => {
    expect(checkDue({ checkEveryDays: null, last: null }, "2026-03-02").isOverdue).toBe(false);
    expect(checkDue({ checkEveryDays: 7, last: null }, "2026-03-02")).toEqual({
      state: "never-checked",
      dueOn: null,
      isOverdue: true,
    });
  });

  it("refuses a day that does not exist", () => {
    expect(() => checkDue({ checkEveryDays: 7, last: good("2026-02-30") }, "2026-03-02")).toThrow(RangeError);
  });
});
