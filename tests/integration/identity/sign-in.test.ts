import * as argon2 from "@node-rs/argon2";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { MINUTE_MS } from "@/lib/clock";
import { findSession, signIn, suspendPerson } from "@/modules/identity";
import { session } from "@/modules/identity/schema";
import { testBench } from "../../support/database";
import { administrator, PASSWORD } from "../../support/one-time-links";

vi.mock("@node-rs/argon2", async (original) => {
  const actual = await original<typeof argon2>();
  return { ...actual, hash: vi.fn(actual.hash), verify: vi.fn(actual.verify) };
});

const verify = vi.mocked(argon2.verify);
const EMAIL = "mara@corran.example";

async function bench() {
  const made = testBench();
  const personId = await administrator(made);
  const enter = (email: string, password: string, address = "192.0.2.7") =>
    signIn(made.db, made.clock, { email, password, address });
  return { ...made, personId, enter };
}

beforeEach(() => {
  verify.mockClear();
});

describe("signing in", () => {
  it("with the right password begins a session of that person", async () => {
    const { db, clock, personId, enter } = await bench();
    const answer = await enter("MARA@corran.example", PASSWORD);
    if (answer.kind !== "signed-in") throw new Error(answer.kind);
    const found = findSession(db.reader.orm, answer.secret, clock.now());
    expect(found).toMatchObject({ kind: "actor", actor: { personId, roles: ["admin"] } });
  });

  it("answers alike, and checks one password each, for a wrong password, an unknown account and a suspended one", async () => {
    const { enter, run, person, personId } = await bench();
    const other = person("Tove Lindqvist", ["admin"]);
    // The check against nothing makes its own hash once; that is not part of what is compared.
    await enter("nobody@corran.example", "wrong wrong wrong");
    const answers = [];
    for (const [email, password] of [
      [EMAIL, "wrong wrong wrong"],
      ["nobody-else@corran.example", "wrong wrong wrong"],
    ] as const) {
      verify.mockClear();
      answers.push(await enter(email, password));
      expect(verify).toHaveBeenCalledTimes(1);
    }
    run(other, suspendPerson, { personId, reason: "left the station" });
    verify.mockClear();
    answers.push(await enter(EMAIL, PASSWORD));
    expect(verify).toHaveBeenCalledTimes(1);
    expect(answers).toEqual([{ kind: "refused" }, { kind: "refused" }, { kind: "refused" }]);
  });

  it("of one account waits after eight wrong tries, before any hashing, even with the right password", async () => {
    const { enter, clock } = await bench();
    for (let index = 0; index < 8; index += 1) {
      expect(await enter(EMAIL, "wrong wrong wrong", `192.0.2.${index}`)).toEqual({ kind: "refused" });
    }
    verify.mockClear();
    expect(await enter(EMAIL, PASSWORD, "198.51.100.1")).toEqual({ kind: "throttled" });
    expect(verify).not.toHaveBeenCalled();
    clock.set(clock.now() + 15 * MINUTE_MS);
    expect((await enter(EMAIL, PASSWORD)).kind).toBe("signed-in");
  });

  it("throttles an unknown account like a known one", async () => {
    const { enter } = await bench();
    for (let index = 0; index < 8; index += 1)
      await enter("nobody@corran.example", "wrong", `192.0.2.${index}`);
    expect(await enter("nobody@corran.example", "wrong")).toEqual({ kind: "throttled" });
  });

  it("from one address waits after forty wrong tries, whatever the accounts", async () => {
    const { enter } = await bench();
    verify.mockResolvedValue(false);
    for (let index = 0; index < 40; index += 1) await enter(`nobody${index}@corran.example`, "wrong");
    verify.mockClear();
    expect(await enter(EMAIL, PASSWORD)).toEqual({ kind: "throttled" });
    expect(verify).not.toHaveBeenCalled();
    verify.mockReset();
  });

  it("many times at once cannot slip past the throttle", async () => {
    const { enter } = await bench();
    verify.mockResolvedValue(false);
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, index) => enter(EMAIL, "wrong", `192.0.2.${index}`)),
    );
    expect(answers.filter((answer) => answer.kind === "refused")).toHaveLength(8);
    expect(verify).toHaveBeenCalledTimes(8);
    verify.mockReset();
  });

  it("rightly uses up none of the address's tries: a whole shift signs in from one place", async () => {
    const { enter } = await bench();
    verify.mockResolvedValue(true);
    for (let index = 0; index < 60; index += 1) expect((await enter(EMAIL, PASSWORD)).kind).toBe("signed-in");
    verify.mockReset();
  });

  it("is refused where the password check itself fails", async () => {
    const { enter } = await bench();
    verify.mockRejectedValueOnce(new Error("out of memory"));
    expect(await enter(EMAIL, PASSWORD)).toEqual({ kind: "refused" });
  });

  it("gives another secret each time, of which the database holds only the hash", async () => {
    const { enter, db } = await bench();
    const actual = await vi.importActual<typeof argon2>("@node-rs/argon2");
    verify.mockImplementation(actual.verify);
    const [first, second] = [await enter(EMAIL, PASSWORD), await enter(EMAIL, PASSWORD)];
    if (first.kind !== "signed-in" || second.kind !== "signed-in") throw new Error("refused");
    expect(first.secret).not.toBe(second.secret);
    const stored = JSON.stringify(db.reader.orm.select().from(session).all());
    expect(stored).not.toContain(first.secret);
    expect(stored).not.toContain(second.secret);
  });
});
