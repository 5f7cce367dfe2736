import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { definePermissions } from "@/modules/access";
import { defineCommand, verifyHistory } from "@/modules/audit";
import { auditChange, auditEntry } from "@/modules/audit/schema";
import { person } from "@/modules/identity/schema";
import { testBench } from "../../support/database";

const may = definePermissions("trial", {
  rename: { says: "rename a person", roles: { admin: "everywhere" } },
  tend: { says: "tend an area", roles: { aquarist: "own areas", lead: "everywhere" } },
});

const rename = defineCommand({
  verb: "renameForTrial",
  permission: may.rename,
  input: z.strictObject({
    id: z.number().int(),
    name: z.string().min(1, "Write a name."),
    fail: z.boolean().default(false),
  }),
  run(ctx, { id, name, fail }) {
    ctx.db.update(person).set({ name }).where(eq(person.id, id)).run();
    if (fail) throw new Error("the seal never happens");
    return {
      result: { name },
      event: {
        kind: { verb: "person.renamed", version: 1, says: "renamed" },
        subject: { type: "person", id },
      },
    };
  },
});

const tend = defineCommand({
  verb: "tendForTrial",
  permission: may.tend,
  input: z.strictObject({ areaId: z.number().int() }),
  areas: (_ctx, { areaId }) => [areaId],
  run: (_ctx, { areaId }) => ({
    result: areaId,
    event: { kind: { verb: "area.tended", version: 1, says: "tended" } },
  }),
});

const count = (bench: ReturnType<typeof testBench>) =>
  (bench.db.reader.sqlite.prepare("select count(*) as n from audit_entry").get() as { n: number }).n;

describe("a command", () => {
  it("leaves an entry with the row before and after", () => {
    const bench = testBench();
    const admin = bench.person("Ines Marlow", ["admin"]);
    bench.run(admin, rename, { id: admin.personId ?? 0, name: "Inés Marlow" });
    const entry = bench.db.reader.orm
      .select()
      .from(auditEntry)
      .where(eq(auditEntry.verb, "person.renamed"))
      .get();
    const change = bench.db.reader.orm
      .select()
      .from(auditChange)
      .where(eq(auditChange.entryId, entry?.id ?? 0))
      .all();
    expect(change).toHaveLength(1);
    expect(JSON.parse(change[0]?.before ?? "")).toMatchObject({ name: "Ines Marlow" });
    expect(JSON.parse(change[0]?.after ?? "")).toMatchObject({ name: "Inés Marlow" });
    expect(verifyHistory(bench.db.reader.sqlite).findings).toEqual([]);
  });

  it("that fails leaves neither data nor entry", () => {
    const bench = testBench();
    const admin = bench.person("Ines Marlow", ["admin"]);
    const before = count(bench);
    expect(() => bench.run(admin, rename, { id: admin.personId ?? 0, name: "X", fail: true })).toThrow(
      "never happens",
    );
    expect(count(bench)).toBe(before);
    expect(bench.db.reader.orm.select().from(person).get()?.name).toBe("Ines Marlow");
  });

  it("is refused to a role that the permission does not name, and leaves nothing", () => {
    const bench = testBench();
    const reader = bench.person("Ada Finch", ["reader"]);
    const before = count(bench);
    expect(() => bench.run(reader, rename, { id: 1, name: "X" })).toThrow("does not allow you to rename");
    expect(count(bench)).toBe(before);
  });

  it("sent twice with one key is carried out once and answers the same", () => {
    const bench = testBench();
    const admin = bench.person("Ines Marlow", ["admin"]);
    const input = { id: admin.personId ?? 0, name: "Inés" };
    const first = bench.run(admin, rename, input, { idempotencyKey: "k-1" });
    const before = count(bench);
    expect(bench.run(admin, rename, input, { idempotencyKey: "k-1" })).toEqual(first);
    expect(count(bench)).toBe(before);
    expect(() => bench.run(admin, rename, { ...input, name: "Other" }, { idempotencyKey: "k-1" })).toThrow(
      "idempotency key",
    );
  });

  it("in another area than one's own is refused", () => {
    const bench = testBench();
    const aquarist = bench.person("Joe Okafor", ["aquarist"], [1]);
    const lead = bench.person("Ines Marlow", ["lead"]);
    expect(bench.run(aquarist, tend, { areaId: 1 })).toBe(1);
    expect(() => bench.run(aquarist, tend, { areaId: 2 })).toThrow("areas you are assigned to");
    expect(bench.run(lead, tend, { areaId: 2 })).toBe(2);
  });

  it("with wrong input names every wrong field by a JSON pointer", () => {
    const bench = testBench();
    const admin = bench.person("Ines Marlow", ["admin"]);
    try {
      bench.run(admin, rename, { id: "x" as never, name: "", extra: 1 } as never);
      expect.unreachable();
    } catch (cause) {
      expect((cause as { errors: { pointer: string }[] }).errors.map((error) => error.pointer)).toEqual([
        "/id",
        "/name",
        "",
      ]);
    }
  });
});

describe("a write outside a command", () => {
  it("fails on any captured table", () => {
    const { db } = testBench();
    const insert =
      "insert into identity_person (name, email, state, created_at) values ('X', 'x@corran.example', 'active', 0)";
    expect(() => db.writer.sqlite.exec(insert)).toThrow("outside a command");
  });

  it("cannot replace a row either", () => {
    const bench = testBench();
    bench.person("Ines Marlow", ["admin"]);
    const replace =
      "insert or replace into identity_person (id, name, email, state, created_at) values (1, 'X', 'x@corran.example', 'active', 0)";
    expect(() => bench.db.writer.sqlite.exec(replace)).toThrow("outside a command");
  });

  it("cannot touch the history", () => {
    const bench = testBench();
    bench.person("Ines Marlow", ["admin"]);
    const { sqlite } = bench.db.writer;
    expect(() => sqlite.exec("update audit_entry set verb = 'x'")).toThrow("only added to");
    expect(() => sqlite.exec("delete from audit_change")).toThrow("only added to");
    expect(() =>
      sqlite.exec("insert or replace into audit_change select * from audit_change limit 1"),
    ).toThrow();
  });
});
