import { describe, expect, it } from "vitest";
import { ApiProblem, NetworkProblem } from "@/lib/ui/api";
import { countOutbox, Outbox, type OutgoingReading } from "./outbox";

type Call = { path: string; body: unknown; key: string | undefined };

/** An outbox with a server that does as it is told, a store, and a timer that goes off by hand. */
function bench(store = new Map<string, string>()) {
  const calls: Call[] = [];
  const timers: { run: () => void; ms: number }[] = [];
  let behave: () => Error | undefined = () => undefined;
  const outbox = new Outbox({
    personId: 7,
    now: () => 1000,
    later: (run, ms) => {
      const timer = { run, ms };
      timers.push(timer);
      return () => timers.splice(timers.indexOf(timer), 1);
    },
    keep: {
      getItem: (key) => store.get(key) ?? null,
      setItem: (key, value) => void store.set(key, value),
      removeItem: (key) => void store.delete(key),
    },
    send: async <Answer>(path: string, body: unknown, options: { idempotencyKey?: string } = {}) => {
      calls.push({ path, body, key: options.idempotencyKey });
      const fault = behave();
      if (fault) throw fault;
      const [reading] = (body as { readings?: OutgoingReading[] }).readings ?? [];
      const answer = {
        uuid: reading?.uuid,
        readingId: 41,
        isRepeat: false,
        status: "within",
        side: null,
        sentence: "",
      };
      return { data: { readings: [{ ...answer, mustBeConfirmed: false }] } } as Answer;
    },
  });
  return { outbox, calls, timers, store, answerWith: (next: () => Error | undefined) => (behave = next) };
}

const item = (uuid: string) => ({
  cell: "1:1",
  label: "KELP-01, Temperature",
  source: "entry" as const,
  canonical: 13.4,
  guessed: "within" as const,
  reading: {
    uuid,
    pointId: 1,
    parameterId: 1,
    typedText: "13.4",
    typedUnit: "°C",
    takenAt: 500,
    takenBy: null,
    methodId: null,
    instrumentId: null,
    confirmed: false,
  },
});
const settle = () => new Promise((done) => setTimeout(done));
const refusal = (status: number, detail: string) =>
  new ApiProblem({ type: "urn:stillwell:problem:x", title: "No", status, detail });

describe("the outbox", () => {
  it("sends a value at once, its UUID being its idempotency key", async () => {
    const { outbox, calls, store } = bench();
    outbox.add(item("a"));
    expect(calls).toHaveLength(1);
    expect(calls[0]).toMatchObject({ path: "/api/v1/readings", key: "a", body: { source: "entry" } });
    await settle();
    expect(outbox.snapshot().items[0]).toMatchObject({ stage: "sent", answer: { readingId: 41 } });
    expect(store.size).toBe(0);
  });

  it("keeps what could not be sent and sends it again by itself under the same key", async () => {
    const { outbox, calls, timers, answerWith } = bench();
    answerWith(() => new NetworkProblem(null));
    outbox.add(item("a"));
    await settle();
    expect(outbox.snapshot()).toMatchObject({ stuckSince: 1000, items: [{ stage: "waiting" }] });
    answerWith(() => undefined);
    timers[0]?.run();
    await settle();
    expect(outbox.snapshot()).toMatchObject({ stuckSince: null, items: [{ stage: "sent" }] });
    expect(calls.map((call) => call.key)).toEqual(["a", "a"]);
  });

  it("waits longer after each failure, and never forgets a value by itself", async () => {
    const { outbox, timers, answerWith } = bench();
    answerWith(() => refusal(503, "busy"));
    outbox.add(item("a"));
    const pauses: number[] = [];
    for (let round = 0; round < 6; round += 1) {
      await settle();
      const timer = timers.pop();
      pauses.push(timer?.ms ?? 0);
      timer?.run();
    }
    await settle();
    expect(pauses).toEqual([1_500, 4_000, 10_000, 30_000, 30_000, 30_000]);
    expect(outbox.snapshot().items).toMatchObject([{ stage: "waiting" }]);
  });

  it("gives a value that was not sent to the next page of the same person alone", async () => {
    const first = bench();
    first.answerWith(() => new NetworkProblem(null));
    first.outbox.add(item("a"));
    await settle();
    const second = bench(first.store);
    expect(second.outbox.snapshot().items).toMatchObject([{ reading: { uuid: "a" }, stage: "queued" }]);
    second.outbox.retry();
    await settle();
    expect(second.calls[0]?.key).toBe("a");
    const other = new Outbox({
      personId: 8,
      now: () => 0,
      later: () => () => undefined,
      keep: {
        getItem: (key) => first.store.get(key) ?? null,
        setItem: () => undefined,
        removeItem: () => undefined,
      },
    });
    expect(other.snapshot().items).toEqual([]);
  });

  it("does not try a refused value again, keeps its sentence, and gives it back to be mended", async () => {
    const { outbox, calls, timers, answerWith } = bench();
    answerWith(() => refusal(422, "The time lies in the future."));
    outbox.add(item("a"));
    await settle();
    expect(outbox.snapshot().items).toMatchObject([
      { stage: "refused", sentence: "The time lies in the future." },
    ]);
    expect(timers).toEqual([]);
    outbox.retry();
    await settle();
    expect(calls).toHaveLength(1);
    outbox.takeBack("a");
    expect(outbox.snapshot().items).toEqual([]);
  });

  it("cannot take back a value that may have reached the server", async () => {
    const { outbox, answerWith } = bench();
    answerWith(() => new NetworkProblem(null));
    outbox.add(item("a"));
    await settle();
    outbox.takeBack("a");
    expect(outbox.snapshot().items).toHaveLength(1);
  });

  it("stops trying when the session has ended, and goes on after signing in", async () => {
    const { outbox, calls, timers, answerWith } = bench();
    answerWith(() => refusal(401, "Sign in again."));
    outbox.add(item("a"));
    await settle();
    expect(outbox.snapshot()).toMatchObject({ signedOut: true });
    expect(timers).toEqual([]);
    answerWith(() => undefined);
    outbox.retry();
    await settle();
    expect(outbox.snapshot()).toMatchObject({ signedOut: false, items: [{ stage: "sent" }] });
    expect(calls).toHaveLength(2);
  });

  it("sends an explanation after its reading, also when it was written before the reading was stored", async () => {
    const { outbox, calls, timers, answerWith } = bench();
    answerWith(() => new NetworkProblem(null));
    outbox.add(item("a"));
    outbox.follow("a", "explanation", { text: "The chiller was off." });
    await settle();
    expect(calls.map((call) => call.path)).toEqual(["/api/v1/readings"]);
    answerWith(() => undefined);
    timers[0]?.run();
    await settle();
    expect(calls.at(-1)).toMatchObject({
      path: "/api/v1/readings/41/explanation",
      body: { text: "The chiller was off." },
    });
  });

  it("has at most four requests under way and sends all of ninety-six", async () => {
    let under = 0;
    let most = 0;
    const outbox = new Outbox({
      personId: 1,
      keep: null,
      now: () => 0,
      later: () => () => undefined,
      send: async <Answer>() => {
        under += 1;
        most = Math.max(most, under);
        await settle();
        under -= 1;
        return { data: { readings: [] } } as Answer;
      },
    });
    for (let index = 0; index < 96; index += 1) outbox.add(item(`u${index}`));
    for (let round = 0; round < 40; round += 1) await settle();
    expect(most).toBe(4);
    expect(countOutbox(outbox.snapshot())).toEqual({ sent: 96, moving: 0, notSent: 0 });
  });
});
