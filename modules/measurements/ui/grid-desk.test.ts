import { describe, expect, it } from "vitest";
import { ApiProblem, NetworkProblem } from "@/lib/ui/api";
import { aReading, aWatchRow, HOUR } from "@/tests/support/watch-row";
import type { WatchRow } from "../model";
import { GridDesk } from "./grid-desk";
import { layOutSheet } from "./grid-model";
import { Outbox, type OutgoingReading } from "./outbox";

const NOW = Date.UTC(2026, 2, 2, 9, 0);
const settle = () => new Promise((done) => setTimeout(done));

const temperature = (pointId: number, more: Parameters<typeof aWatchRow>[0] = {}) =>
  aWatchRow({
    pointId,
    systemCode: `KELP-0${pointId}`,
    bounds: { toleranceLow: 12, toleranceHigh: 15 },
    ...more,
  });

/** A desk over these rows, and what was sent from it. */
function bench(rows: WatchRow[] = [temperature(1), temperature(2), temperature(3)]) {
  const sent: OutgoingReading[] = [];
  let fault: Error | null = null;
  let mustBeConfirmed = false;
  let count = 0;
  const paths: string[] = [];
  const outbox = new Outbox({
    personId: 1,
    keep: null,
    now: () => NOW,
    later: () => () => undefined,
    send: async <Answer>(path: string, body: unknown) => {
      paths.push(path);
      if (fault) throw fault;
      const readings = (body as { readings?: OutgoingReading[] }).readings ?? [];
      sent.push(...readings);
      const answer = {
        readingId: 7,
        isRepeat: false,
        status: mustBeConfirmed ? "out" : "within",
        side: null,
        sentence: "",
      };
      return {
        data: { readings: readings.map(({ uuid }) => ({ ...answer, uuid, mustBeConfirmed })) },
      } as Answer;
    },
  });
  const desk = new GridDesk(layOutSheet(rows), outbox, { now: () => NOW, newUuid: () => `u${(count += 1)}` });
  return {
    desk,
    sent,
    paths,
    fail: (next: Error | null) => (fault = next),
    askToConfirm: () => (mustBeConfirmed = true),
    values: () => sent.map((each) => each.typedText),
  };
}

describe("typing at the desk", () => {
  it("hands a value within its limits over at once", async () => {
    const { desk, sent } = bench();
    expect(desk.type("1:1", "13,4")).toBe("sent");
    expect(sent).toMatchObject([
      { typedText: "13,4", typedUnit: "°C", takenAt: NOW, confirmed: false, pointId: 1 },
    ]);
    await settle();
    expect(desk.view("1:1")).toMatchObject({ stage: "sent", text: "13,4", isOpen: false, status: "within" });
  });

  it("keeps a value out of tolerance in its cell until it is confirmed", () => {
    const { desk, sent } = bench();
    expect(desk.type("1:1", "18")).toBe("waits");
    expect(sent).toEqual([]);
    expect(desk.view("1:1")).toMatchObject({
      need: "confirm",
      status: "out",
      side: "high",
      ground: "above 15.0",
    });
    expect(desk.waiting().map((view) => view.key)).toEqual(["1:1"]);
    expect(desk.confirm("1:1")).toBe(true);
    expect(sent).toMatchObject([{ typedText: "18", confirmed: true }]);
    expect(desk.waiting()).toEqual([]);
  });

  it("never confirms by typing the same again", () => {
    const { desk, sent } = bench();
    desk.type("1:1", "18");
    expect(desk.type("1:1", "18")).toBe("waits");
    expect(sent).toEqual([]);
  });

  it("keeps what cannot be read, says why, and cannot confirm it", () => {
    const { desk, sent } = bench();
    expect(desk.type("1:1", "warm")).toBe("waits");
    expect(desk.view("1:1")).toMatchObject({ need: "mend", text: "warm" });
    expect(desk.view("1:1").sentence).toContain("is not a number");
    expect(desk.confirm("1:1")).toBe(false);
    expect(sent).toEqual([]);
  });

  it("sends <0.05 and ND as typed", () => {
    const { desk, values } = bench();
    desk.type("1:1", "<0.05");
    desk.type("2:1", "ND");
    expect(values()).toEqual(["ND"]);
    expect(desk.view("1:1").need).toBe("confirm");
  });

  it("takes nothing where nothing is read, nor over a stored value", async () => {
    const { desk, values } = bench();
    expect(desk.type("9:9", "13")).toBe("nothing");
    desk.type("1:1", "13");
    await settle();
    expect(desk.type("1:1", "14")).toBe("nothing");
    expect(values()).toEqual(["13"]);
  });

  it("opens a stored cell for a new measurement, which is another reading", async () => {
    const { desk, sent } = bench();
    desk.type("1:1", "13");
    await settle();
    desk.reopen("1:1");
    expect(desk.view("1:1")).toMatchObject({ isOpen: true, stage: "empty" });
    desk.type("1:1", "13.2");
    expect(new Set(sent.map((each) => each.uuid)).size).toBe(2);
  });

  it("compares the next value with what was sent a moment ago", async () => {
    const { desk } = bench([temperature(1, { bounds: { greatestChange24h: 1 } })]);
    desk.type("1:1", "20");
    await settle();
    desk.reopen("1:1");
    expect(desk.type("1:1", "22")).toBe("waits");
    expect(desk.view("1:1")).toMatchObject({ status: "out", side: "change" });
  });

  it("uses the moment and the person set for the whole sheet, and sends nothing while the moment is wrong", () => {
    const { desk, sent } = bench();
    desk.setTaken({ at: NOW - HOUR, by: 5 });
    desk.type("1:1", "13");
    expect(sent).toMatchObject([{ takenAt: NOW - HOUR, takenBy: 5 }]);
    desk.setTaken(null);
    expect(desk.type("2:1", "13")).toBe("waits");
    expect(sent).toHaveLength(1);
    expect(desk.view("2:1").sentence).toContain("when the values were taken");
    desk.setTaken({ at: null, by: null });
    expect(desk.type("2:1", "13")).toBe("sent");
  });

  it("asks to confirm a stored value of which only the server knew that it is off", async () => {
    const { desk, askToConfirm, paths } = bench();
    askToConfirm();
    desk.type("1:1", "13");
    await settle();
    expect(desk.view("1:1").need).toBe("confirm");
    expect(desk.confirm("1:1")).toBe(true);
    await settle();
    expect(paths.at(-1)).toBe("/api/v1/readings/7/confirmation");
    expect(desk.view("1:1").need).toBeNull();
  });

  it("gives a refused value back to be typed over", async () => {
    const { desk, fail, values } = bench();
    fail(new ApiProblem({ type: "x:retired", title: "No", status: 409, detail: "KELP-01 is retired." }));
    desk.type("1:1", "13");
    await settle();
    expect(desk.view("1:1")).toMatchObject({
      stage: "refused",
      need: "mend",
      isOpen: true,
      sentence: "KELP-01 is retired.",
    });
    fail(null);
    expect(desk.type("1:1", "13.1")).toBe("sent");
    expect(values()).toEqual(["13.1"]);
  });

  it("shows a value that the network did not take as not sent, and keeps it", async () => {
    const { desk, fail } = bench();
    fail(new NetworkProblem(null));
    desk.type("1:1", "13");
    await settle();
    expect(desk.view("1:1")).toMatchObject({ stage: "waiting", text: "13", isOpen: false });
  });
});

describe("undo at the desk", () => {
  it("takes back what waits, and never a value that was handed over", () => {
    const { desk, values } = bench();
    desk.type("1:1", "13");
    desk.type("2:1", "18");
    desk.undo();
    desk.undo();
    expect(desk.view("2:1").text).toBe("");
    expect(desk.view("1:1").text).toBe("13");
    desk.redo();
    expect(desk.view("2:1").text).toBe("18");
    expect(values()).toEqual(["13"]);
  });
});

describe("a block at the desk", () => {
  it("sends nothing until each value can be read and what is off is confirmed, then all together", () => {
    const { desk, values } = bench();
    expect(desk.paste({ row: 0, column: 0 }, [["13.4"], ["warm"], ["18"]])).toEqual({ placed: 3, lost: [] });
    expect(desk.block()).toEqual({ size: 3, unready: 2 });
    expect(desk.sendBlock()).toBe(0);
    desk.type("2:1", "13.1");
    expect(desk.sendBlock()).toBe(0);
    desk.confirm("3:1");
    expect(values()).toEqual([]);
    expect(desk.sendBlock()).toBe(3);
    expect(values()).toEqual(["13.4", "13.1", "18"]);
    expect(desk.block().size).toBe(0);
  });

  it("leaves a stored cell alone and says so", async () => {
    const { desk } = bench();
    desk.type("1:1", "13");
    await settle();
    const { placed, lost } = desk.paste({ row: 0, column: 0 }, [["14"], ["13.5"]]);
    expect(placed).toBe(1);
    expect(lost).toEqual(["“14”: a value has been sent from this cell already"]);
    expect(desk.view("1:1").text).toBe("13");
  });
});

describe("what stands in an empty cell", () => {
  // 18 °C is 64.4 °F.
  it("is the last value in the unit of the column", () => {
    const rows = [
      {
        ...temperature(1, {
          acceptedUnits: ["°C", "°F"],
          recent: [aReading({ value: 18, takenAt: NOW - HOUR })],
        }),
        unit: "°F",
      },
    ];
    expect(bench(rows).desk.lastValue("1:1")?.value).toBeCloseTo(64.4, 9);
  });
});
