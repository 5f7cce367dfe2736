import { describe, expect, it } from "vitest";
import type { RecentReading, Status, WatchRow } from "@/modules/measurements/model";
import { aWatchRow } from "@/tests/support/watch-row";
import { offNow } from "./off-now";

const read = (id: number, status: Status): RecentReading => ({
  id,
  takenAt: id,
  takenBy: 1,
  value: 1,
  qualifier: "",
  answer: null,
  typedText: "1",
  status,
  side: null,
  sentence: "",
});
const row = (...recent: RecentReading[]): WatchRow => ({ ...aWatchRow(), recent });

describe("what is off now", () => {
  it("is told by the newest reading alone, the gravest first", () => {
    const rows = [
      row(read(1, "watch")),
      row(read(2, "within"), read(3, "out")),
      row(read(4, "out"), read(5, "within")),
    ];
    expect(offNow(rows).map(({ newest }) => newest.id)).toEqual([4, 1]);
    expect(offNow(rows)[0]?.previous?.id).toBe(5);
  });

  it("holds nothing that was never read, cannot be judged or has no limits", () => {
    expect(offNow([row(), row(read(1, "unjudged")), row(read(2, "none"))])).toEqual([]);
  });
});
