import { describe, expect, it } from "vitest";
import { recordAt } from "./record-at";

const one = (id: number, effectiveFromAt: number, decidedAt = effectiveFromAt) =>
  ({ id, status: "approved", effectiveFromAt, decidedAt }) as const;

describe("the volume of record", () => {
  it("is the approved determination that took effect last, its first moment included", () => {
    const all = [one(1, 100), one(2, 300), one(3, 200)];
    expect(recordAt(all, 99)).toBeNull();
    expect(recordAt(all, 100)?.id).toBe(1);
    expect(recordAt(all, 299)?.id).toBe(3);
    expect(recordAt(all, 300)?.id).toBe(2);
  });

  it("is never one that is proposed or declined", () => {
    const waiting = { ...one(2, 200), status: "proposed" } as const;
    const declined = { ...one(3, 300), status: "declined" } as const;
    expect(recordAt([one(1, 100), waiting, declined], 400)?.id).toBe(1);
  });

  it("is the later approval where two took effect together", () => {
    expect(recordAt([one(1, 100, 150), one(2, 100, 120)], 200)?.id).toBe(1);
  });
});
