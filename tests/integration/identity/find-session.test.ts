import { describe, expect, it } from "vitest";
import { HOUR_MS, MINUTE_MS } from "@/lib/clock";
import { settings } from "@/lib/env";
import { runCommand, upkeep } from "@/modules/audit";
import {
  bindAreas,
  endRole,
  endSession,
  findSession,
  grantRole,
  reinstatePerson,
  signIn,
  suspendPerson,
  touchSession,
} from "@/modules/identity";
import { type TestBench, testBench } from "../../support/database";
import { administrator, PASSWORD } from "../../support/one-time-links";

async function signedIn() {
  const bench = testBench();
  const personId = await administrator(bench);
  const given = { email: "mara@corran.example", password: PASSWORD, address: "direct" };
  const answer = await signIn(bench.db, bench.clock, given);
  if (answer.kind !== "signed-in") throw new Error(answer.kind);
  const boss = bench.person("Tove Lindqvist", ["admin"]);
  return { ...bench, personId, secret: answer.secret, boss };
}

const look = ({ db, clock }: Pick<TestBench, "db" | "clock">, secret: string) =>
  findSession(db.reader.orm, secret, clock.now());

describe("a session", () => {
  it("is refused on the very next request once its person is suspended, and stays so after they are let back in", async () => {
    const bench = await signedIn();
    expect(look(bench, bench.secret).kind).toBe("actor");
    bench.run(bench.boss, suspendPerson, { personId: bench.personId, reason: "left the station" });
    expect(look(bench, bench.secret)).toEqual({ kind: "ended" });
    bench.run(bench.boss, reinstatePerson, { personId: bench.personId });
    expect(look(bench, bench.secret)).toEqual({ kind: "ended" });
  });

  it("loses a role on the very next request, and gains one as soon", async () => {
    const bench = await signedIn();
    bench.run(bench.boss, grantRole, { personId: bench.personId, role: "lead" });
    expect(look(bench, bench.secret)).toMatchObject({ actor: { roles: ["admin", "lead"] } });
    bench.run(bench.boss, endRole, { personId: bench.personId, role: "admin", reason: "other duties" });
    expect(look(bench, bench.secret)).toMatchObject({ actor: { roles: ["lead"] } });
  });

  it("follows a change of areas on the very next request", async () => {
    const bench = await signedIn();
    expect(look(bench, bench.secret)).toMatchObject({ actor: { areaIds: null } });
    bench.run(bench.boss, bindAreas, { personId: bench.personId, areaIds: [2, 3] });
    expect(look(bench, bench.secret)).toMatchObject({ actor: { areaIds: [2, 3] } });
    bench.run(bench.boss, bindAreas, { personId: bench.personId, areaIds: [3] });
    expect(look(bench, bench.secret)).toMatchObject({ actor: { areaIds: [3] } });
  });

  it("ends when it has been idle too long, not before, and being used keeps it open", async () => {
    const bench = await signedIn();
    const idle = settings().SESSION_IDLE_MINUTES * MINUTE_MS;
    const began = bench.clock.now();
    bench.clock.set(began + idle);
    const found = look(bench, bench.secret);
    if (found.kind !== "actor") throw new Error(found.kind);
    upkeep(bench.db, (orm) =>
      touchSession(orm, found.actor.sessionId ?? "", found.seenAt, bench.clock.now()),
    );
    bench.clock.set(began + 2 * idle);
    expect(look(bench, bench.secret).kind).toBe("actor");
    bench.clock.set(began + 2 * idle + 1);
    expect(look(bench, bench.secret)).toEqual({ kind: "ended" });
  });

  it("ends at its absolute limit however much it is used", async () => {
    const bench = await signedIn();
    const began = bench.clock.now();
    const limit = began + settings().SESSION_ABSOLUTE_HOURS * HOUR_MS;
    const found = look(bench, bench.secret);
    if (found.kind !== "actor") throw new Error(found.kind);
    upkeep(bench.db, (orm) => touchSession(orm, found.actor.sessionId ?? "", began, limit));
    bench.clock.set(limit);
    expect(look(bench, bench.secret).kind).toBe("actor");
    bench.clock.set(limit + 1);
    expect(look(bench, bench.secret)).toEqual({ kind: "ended" });
  });

  it("ends when its person signs out, and another session of theirs goes on", async () => {
    const bench = await signedIn();
    const given = { email: "mara@corran.example", password: PASSWORD, address: "direct" };
    const second = await signIn(bench.db, bench.clock, given);
    if (second.kind !== "signed-in") throw new Error(second.kind);
    const found = look(bench, bench.secret);
    if (found.kind !== "actor") throw new Error(found.kind);
    runCommand(bench.db, found.actor, endSession, {}, { clock: bench.clock });
    expect(look(bench, bench.secret)).toEqual({ kind: "ended" });
    expect(look(bench, second.secret).kind).toBe("actor");
  });

  it("of nobody is none", async () => {
    const bench = await signedIn();
    expect(look(bench, "x".repeat(43))).toEqual({ kind: "none" });
  });
});
