import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import {
  askForReset,
  changeOwnPassword,
  findOpenLink,
  findSession,
  invitePerson,
  repeatInvitation,
  setPasswordByLink,
  signIn,
  suspendPerson,
} from "@/modules/identity";
import { oneTimeLink, person } from "@/modules/identity/schema";
import { mail } from "@/modules/notifications/schema";
import { type TestBench, testBench } from "../../support/database";
import { administrator, PASSWORD, secretInMail } from "../../support/one-time-links";

const NEW = "urchin ladder seven kelp";
const GUEST = "joe@corran.example";

function invited() {
  const bench = testBench();
  const boss = bench.person("Tove Lindqvist", ["admin"]);
  const { personId } = bench.run(boss, invitePerson, {
    name: "Joe Okafor",
    email: GUEST,
    roles: ["aquarist"],
  });
  return { ...bench, boss, personId };
}

const choose = ({ db, clock }: Pick<TestBench, "db" | "clock">, token: string, password = NEW) =>
  setPasswordByLink(db, clock, { token, password }, "direct");
const enter = ({ db, clock }: Pick<TestBench, "db" | "clock">, email: string, password: string) =>
  signIn(db, clock, { email, password, address: "direct" });

describe("an invitation", () => {
  it("goes out by mail, lets its person choose a password and come in with the roles given", async () => {
    const bench = invited();
    expect(await enter(bench, GUEST, NEW)).toEqual({ kind: "refused" });
    expect(await choose(bench, secretInMail(bench, GUEST))).toMatchObject({ email: GUEST });
    const answer = await enter(bench, GUEST, NEW);
    if (answer.kind !== "signed-in") throw new Error(answer.kind);
    const found = findSession(bench.db.reader.orm, answer.secret, bench.clock.now());
    expect(found).toMatchObject({ actor: { name: "Joe Okafor", roles: ["aquarist"] } });
  });

  it("works once", async () => {
    const bench = invited();
    const token = secretInMail(bench, GUEST);
    await choose(bench, token);
    await expect(choose(bench, token, "another password here")).rejects.toThrow("used or is too old");
    expect((await enter(bench, GUEST, "another password here")).kind).toBe("refused");
  });

  it("lasts for seven days", async () => {
    const bench = invited();
    const token = secretInMail(bench, GUEST);
    bench.clock.set(bench.clock.now() + 7 * DAY_MS);
    await expect(choose(bench, token)).rejects.toThrow("used or is too old");
  });

  it("sent again makes the former one void", async () => {
    const bench = invited();
    const former = secretInMail(bench, GUEST);
    bench.run(bench.boss, repeatInvitation, { personId: bench.personId });
    const latter = secretInMail(bench, GUEST);
    expect(latter).not.toBe(former);
    await expect(choose(bench, former)).rejects.toThrow("used or is too old");
    await choose(bench, latter);
  });

  it("does not let in somebody who was suspended meanwhile", async () => {
    const bench = invited();
    const token = secretInMail(bench, GUEST);
    bench.run(bench.boss, suspendPerson, { personId: bench.personId, reason: "a mistake" });
    await expect(choose(bench, token)).rejects.toThrow("used or is too old");
  });

  it("to an address that is taken is refused under that field, whatever its case", () => {
    const bench = invited();
    const again = { name: "Joe Again", email: "JOE@corran.example" };
    expect(() => bench.run(bench.boss, invitePerson, again)).toThrow("here already");
    expect(bench.db.reader.orm.select().from(person).all()).toHaveLength(2);
  });

  it("is stored as a hash", () => {
    const bench = invited();
    const links = JSON.stringify(bench.db.reader.orm.select().from(oneTimeLink).all());
    expect(links).not.toContain(secretInMail(bench, GUEST));
  });

  it("with a weak password is refused with a sentence and stays open", async () => {
    const bench = invited();
    const token = secretInMail(bench, GUEST);
    await expect(choose(bench, token, "short")).rejects.toMatchObject({
      errors: [{ pointer: "/password", detail: expect.stringContaining("at least 12 characters") }],
    });
    await expect(choose(bench, token, "aaaaaaaaaaaaaaa")).rejects.toMatchObject({
      errors: [{ pointer: "/password", detail: expect.stringContaining("five different") }],
    });
    expect(findOpenLink(bench.db.reader.orm, token, bench.clock.now())).toBeDefined();
  });

  it("that is guessed at is throttled", async () => {
    const bench = invited();
    for (let index = 0; index < 40; index += 1) {
      await expect(choose(bench, `guess-${index}-${"x".repeat(20)}`)).rejects.toThrow("used or is too old");
    }
    await expect(choose(bench, `guess-x-${"x".repeat(20)}`)).rejects.toThrow("Too many tries");
  });
});

describe("a new password", () => {
  it("by a link ends every session of the account, and the old password works no more", async () => {
    const bench = testBench();
    await administrator(bench);
    const before = await enter(bench, "mara@corran.example", PASSWORD);
    if (before.kind !== "signed-in") throw new Error(before.kind);
    askForReset(bench.db, bench.clock, { email: "Mara@corran.example" }, "direct");
    await choose(bench, secretInMail(bench, "mara@corran.example"));
    expect(findSession(bench.db.reader.orm, before.secret, bench.clock.now())).toEqual({ kind: "ended" });
    expect((await enter(bench, "mara@corran.example", PASSWORD)).kind).toBe("refused");
    expect((await enter(bench, "mara@corran.example", NEW)).kind).toBe("signed-in");
  });

  it("can be asked for within the hour that its link lasts", async () => {
    const bench = testBench();
    await administrator(bench);
    askForReset(bench.db, bench.clock, { email: "mara@corran.example" }, "direct");
    bench.clock.set(bench.clock.now() + HOUR_MS);
    await expect(choose(bench, secretInMail(bench, "mara@corran.example"))).rejects.toThrow("too old");
  });

  it("asked for an unknown, an invited or a suspended account answers the same and writes no letter", () => {
    const bench = invited();
    const left = bench.person("Ada Finch", ["reader"]);
    bench.run(bench.boss, suspendPerson, { personId: left.personId ?? 0, reason: "left" });
    const letters = () => bench.db.reader.orm.select().from(mail).where(eq(mail.kind, "reset")).all();
    for (const email of ["nobody@corran.example", GUEST, "ada.finch@corran.example"]) {
      expect(askForReset(bench.db, bench.clock, { email }, "direct")).toBeUndefined();
    }
    expect(letters()).toHaveLength(0);
  });

  it("asked for one account again and again is throttled, so that nobody's mail is flooded", () => {
    const bench = testBench();
    const ask = (address: string) =>
      askForReset(bench.db, bench.clock, { email: "nobody@corran.example" }, address);
    for (let index = 0; index < 8; index += 1) ask(`192.0.2.${index}`);
    expect(() => ask("198.51.100.1")).toThrow("Too many tries");
  });

  it("of one's own needs the present one, ends the other sessions and keeps this one", async () => {
    const bench = testBench();
    await administrator(bench);
    const [here, elsewhere] = [
      await enter(bench, "mara@corran.example", PASSWORD),
      await enter(bench, "mara@corran.example", PASSWORD),
    ];
    if (here.kind !== "signed-in" || elsewhere.kind !== "signed-in") throw new Error("refused");
    const found = findSession(bench.db.reader.orm, here.secret, bench.clock.now());
    if (found.kind !== "actor") throw new Error(found.kind);
    const change = (current: string) =>
      changeOwnPassword(bench.db, bench.clock, found.actor, { current, password: NEW });
    await expect(change("wrong wrong wrong")).rejects.toMatchObject({ errors: [{ pointer: "/current" }] });
    await change(PASSWORD);
    expect(findSession(bench.db.reader.orm, here.secret, bench.clock.now()).kind).toBe("actor");
    expect(findSession(bench.db.reader.orm, elsewhere.secret, bench.clock.now())).toEqual({ kind: "ended" });
    expect((await enter(bench, "mara@corran.example", NEW)).kind).toBe("signed-in");
  });
});
