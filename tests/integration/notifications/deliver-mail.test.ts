import { readFileSync } from "node:fs";
import type { AddressInfo } from "node:net";
import path from "node:path";
import { text } from "node:stream/consumers";
import { SMTPServer } from "smtp-server";
import { describe, expect, it } from "vitest";
import { readSettings, settings, useSettings } from "@/lib/env";
import { ROLES } from "@/modules/access";
import { JobRunner } from "@/modules/audit";
import { invitePerson } from "@/modules/identity";
import { deliverMail, listMail } from "@/modules/notifications";
import { testBench } from "../../support/database";

function withLetter() {
  const bench = testBench();
  const boss = bench.person("Mara Quill", ["admin"]);
  bench.run(boss, invitePerson, { name: "Joe Okafor", email: "joe@corran.example" });
  return { ...bench, boss, runner: new JobRunner(bench.db, bench.clock, [deliverMail]) };
}

/** A mail server on this machine that keeps what it gets, or answers every letter with a refusal. */
async function mailServer(refuse = false) {
  const got: { from: string; to: string[]; body: string }[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    logger: false,
    onData(stream, session, done) {
      void text(stream).then((body) => {
        const { mailFrom, rcptTo } = session.envelope;
        if (refuse) return done(Object.assign(new Error("mailbox full"), { responseCode: 452 }));
        got.push({ from: mailFrom ? mailFrom.address : "", to: rcptTo.map((one) => one.address), body });
        return done();
      });
    },
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.server.address() as AddressInfo;
  useSettings({
    ...settings(),
    ...readSettings({
      NODE_ENV: "test",
      LOG_LEVEL: "silent",
      STILLWELL_DATA: settings().dataFolder,
      MAIL_TRANSPORT: "smtp",
      SMTP_HOST: "127.0.0.1",
      SMTP_PORT: String(port),
      MAIL_FROM: "Stillwell <water@corran.example>",
    }),
  });
  return { got, close: () => new Promise<void>((resolve) => server.close(resolve)) };
}

describe("a letter", () => {
  it("is written as an .eml file into the data folder and shown as gone", async () => {
    const { runner, ask, boss } = withLetter();
    expect(ask(boss, listMail, {})).toMatchObject([{ state: "queued", toAddress: "joe@corran.example" }]);
    expect(await runner.drain()).toBe(1);
    const [letter] = ask(boss, listMail, {});
    expect(letter).toMatchObject({ state: "sent", attempts: 1, error: null });
    const written = readFileSync(path.join(settings().dataFolder, "mail", letter?.fileName ?? ""), "utf8");
    expect(written).toMatch(/^To: joe@corran\.example\r$/m);
    expect(written).toMatch(/^Subject: Your sign-in for Corran Sound Marine Station\r$/m);
    expect(written.replaceAll(/=\r\n/g, "")).toMatch(/\/invitation\/[\w-]{43}/);
    expect(await runner.drain()).toBe(0);
  });

  it("shows its one-time link to nobody in the outbox", () => {
    const { ask, boss } = withLetter();
    const [letter] = ask(boss, listMail, {});
    expect(letter?.body).toContain("/invitation/…");
    expect(letter?.body).not.toMatch(/\/invitation\/[\w-]{10,}/);
  });

  it("is shown to administrators and auditors, and to nobody else", () => {
    const { ask, person } = withLetter();
    const others = ROLES.filter((role) => role !== "admin" && role !== "auditor");
    expect(() => ask(person("Ines Marlow", others), listMail, {})).toThrow("does not allow you");
    expect(ask(person("Ruth Calder", ["auditor"]), listMail, {})).toHaveLength(1);
  });

  it("goes to a mail server by SMTP, once", async () => {
    const { runner, ask, boss } = withLetter();
    const server = await mailServer();
    try {
      await runner.drain();
      await runner.drain();
    } finally {
      await server.close();
    }
    expect(server.got).toHaveLength(1);
    expect(server.got[0]).toMatchObject({ from: "water@corran.example", to: ["joe@corran.example"] });
    expect(server.got[0]?.body).toMatch(/^From: Stillwell <water@corran\.example>\r$/m);
    expect(ask(boss, listMail, {})).toMatchObject([{ state: "sent", fileName: null }]);
  });

  it("that the mail server refuses is kept with the reason and tried again later with the same Message-ID", async () => {
    const { runner, ask, boss, clock } = withLetter();
    const refusing = await mailServer(true);
    await runner.drain();
    await refusing.close();
    expect(ask(boss, listMail, {})).toMatchObject([{ state: "failed", attempts: 1 }]);
    expect(ask(boss, listMail, {})[0]?.error).toContain("mailbox full");
    const taking = await mailServer();
    expect(await runner.drain()).toBe(0);
    clock.set(clock.now() + 60_000);
    await runner.drain();
    await taking.close();
    expect(taking.got).toHaveLength(1);
    expect(taking.got[0]?.body).toMatch(/^Message-ID: <[0-9a-f]{32}@localhost>\r$/m);
    expect(ask(boss, listMail, {})).toMatchObject([{ state: "sent", attempts: 2, error: null }]);
  });
});
