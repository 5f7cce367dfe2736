import { describe, expect, it } from "vitest";
import { may } from "@/modules/access";
import {
  actorOf,
  decideRole,
  endRole,
  getPersonRow,
  grantRole,
  identityMay,
  suspendPerson,
} from "@/modules/identity";
import { testBench } from "../../support/database";

function two() {
  const bench = testBench();
  const mara = bench.person("Mara Quill", ["admin"]);
  const tove = bench.person("Tove Lindqvist", ["admin"]);
  const now = (id: number | null) => actorOf(bench.db.reader.orm, id ?? 0, bench.clock.now());
  return { ...bench, mara, tove, now };
}

describe("a role", () => {
  it("given to another works at once", () => {
    const { run, mara, tove, now } = two();
    expect(run(mara, grantRole, { personId: tove.personId, role: "lead" })).toMatchObject({
      state: "active",
    });
    expect(now(tove.personId)?.roles).toEqual(["admin", "lead"]);
  });

  it("given to oneself does nothing until a second administrator approves it", () => {
    const { run, ask, mara, tove, now } = two();
    const { grantId, state } = run(mara, grantRole, { personId: mara.personId, role: "lead" });
    expect(state).toBe("waiting");
    expect(now(mara.personId)?.roles).toEqual(["admin"]);
    expect(ask(tove, getPersonRow, { personId: mara.personId }).waitingRoles).toEqual([
      { grantId, role: "lead", grantedBy: mara.personId },
    ]);
    expect(() => run(mara, decideRole, { grantId, decision: "approve" })).toThrow(
      "another person must decide",
    );
    expect(now(mara.personId)?.roles).toEqual(["admin"]);
    run(tove, decideRole, { grantId, decision: "approve" });
    expect(now(mara.personId)?.roles).toEqual(["admin", "lead"]);
  });

  it("that a second administrator refuses never works, and is decided once", () => {
    const { run, mara, tove, now } = two();
    const { grantId } = run(mara, grantRole, { personId: mara.personId, role: "veterinarian" });
    run(tove, decideRole, { grantId, decision: "refuse" });
    expect(now(mara.personId)?.roles).toEqual(["admin"]);
    expect(() => run(tove, decideRole, { grantId, decision: "approve" })).toThrow("decided already");
  });

  it("is given once at a time", () => {
    const { run, mara, tove } = two();
    run(mara, grantRole, { personId: tove.personId, role: "lead" });
    expect(() => run(mara, grantRole, { personId: tove.personId, role: "lead" })).toThrow("already");
  });

  it("is not given by anybody but an administrator", () => {
    const { run, person, mara } = two();
    const lead = person("Ines Marlow", ["lead", "auditor", "veterinarian"]);
    expect(may(lead, identityMay.grantRoles)).toBe(false);
    expect(() => run(lead, grantRole, { personId: mara.personId, role: "lead" })).toThrow(
      "does not allow you",
    );
  });

  it("of administrator is not taken from the last one who is active", () => {
    const { run, mara, tove } = two();
    run(mara, endRole, { personId: tove.personId, role: "admin", reason: "other duties" });
    const ending = { personId: mara.personId, role: "admin", reason: "leaving" } as const;
    expect(() => run(mara, endRole, ending)).toThrow("last active administrator");
  });

  it("of administrator held by a suspended person does not count as another", () => {
    const { run, mara, tove } = two();
    run(mara, suspendPerson, { personId: tove.personId, reason: "left" });
    const ending = { personId: mara.personId, role: "admin", reason: "leaving" } as const;
    expect(() => run(mara, endRole, ending)).toThrow("last active administrator");
  });

  it("of administrator is not lost by suspending the last one", () => {
    const { run, mara, tove, now } = two();
    const demoted = { personId: mara.personId, role: "admin", reason: "other duties" } as const;
    run(tove, endRole, demoted);
    // Mara's earlier request, still under way as an administrator.
    expect(() => run(mara, suspendPerson, { personId: tove.personId, reason: "left" })).toThrow(
      "last active",
    );
    expect(now(tove.personId)?.roles).toEqual(["admin"]);
  });
});
