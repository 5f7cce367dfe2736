import { describe, expect, it } from "vitest";
import { actorOf, endDeputy, endRole, nameDeputy } from "@/modules/identity";
import { testBench } from "../../support/database";

/** 2026-03-02 is a Monday; London is on UTC then. */
const at = (day: number, hour: number) => Date.UTC(2026, 2, day, hour);

function station() {
  const bench = testBench(at(2, 9));
  const boss = bench.person("Mara Quill", ["admin"]);
  const lead = bench.person("Ines Marlow", ["lead"]);
  const analyst = bench.person("Noor Haddad", ["analyst"]);
  const rolesAt = (moment: number) => actorOf(bench.db.reader.orm, analyst.personId ?? 0, moment)?.roles;
  const days = { role: "lead", fromOn: "2026-03-03", toOn: "2026-03-04" } as const;
  const input = { ...days, personId: lead.personId, deputyId: analyst.personId };
  return { ...bench, boss, lead, analyst, rolesAt, input };
}

describe("a deputy", () => {
  it("holds the role from the first day to the last, both included, and on no other", () => {
    const { run, lead, rolesAt, input } = station();
    run(lead, nameDeputy, input);
    expect(rolesAt(at(2, 23))).toEqual(["analyst"]);
    expect(rolesAt(at(3, 0))).toEqual(["analyst", "lead"]);
    expect(rolesAt(at(4, 23))).toEqual(["analyst", "lead"]);
    expect(rolesAt(at(5, 0))).toEqual(["analyst"]);
  });

  it("holds it only while the other does", () => {
    const { run, boss, lead, rolesAt, input } = station();
    run(lead, nameDeputy, input);
    run(boss, endRole, { personId: lead.personId, role: "lead", reason: "other duties" });
    expect(rolesAt(at(3, 12))).toEqual(["analyst"]);
  });

  it("holds it no longer than until the deputyship is ended", () => {
    const { run, lead, rolesAt, input } = station();
    const { deputyshipId } = run(lead, nameDeputy, input);
    run(lead, endDeputy, { deputyshipId });
    expect(rolesAt(at(3, 12))).toEqual(["analyst"]);
    expect(() => run(lead, endDeputy, { deputyshipId })).toThrow("ended already");
  });

  it("is not named by the deputy, nor by a lead for somebody else", () => {
    const { run, person, boss, analyst, input } = station();
    const other = person("Ada Finch", ["lead"]);
    expect(() => run(analyst, nameDeputy, input)).toThrow("does not allow you");
    expect(() => run(other, nameDeputy, input)).toThrow("for yourself alone");
    const toHerself = { ...input, deputyId: boss.personId };
    expect(() => run(boss, nameDeputy, toHerself)).toThrow("yourself");
  });

  it("does not pass on a role that the other only holds as a deputy", () => {
    const { run, boss, lead, analyst, person, clock, input, db } = station();
    run(lead, nameDeputy, input);
    clock.set(at(3, 9));
    const third = person("Joe Okafor", ["aquarist"]);
    const onward = { ...input, personId: analyst.personId, deputyId: third.personId };
    expect(() => run(boss, nameDeputy, onward)).toThrow("does not hold the role");
    expect(actorOf(db.reader.orm, third.personId ?? 0, at(3, 12))?.roles).toEqual(["aquarist"]);
  });

  it("is refused where the days are in the wrong order, with the field that is wrong", () => {
    const { run, lead, input } = station();
    try {
      run(lead, nameDeputy, { ...input, toOn: "2026-03-01" });
      expect.unreachable();
    } catch (cause) {
      expect(cause).toMatchObject({
        errors: [{ pointer: "/toOn", detail: "The last day is before the first." }],
      });
    }
  });
});
