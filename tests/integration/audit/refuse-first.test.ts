import { describe, expect, it } from "vitest";
import { z } from "zod";
import { definePermissions } from "@/modules/access";
import { defineCommand, defineQuery } from "@/modules/audit";
import { testBench } from "../../support/database";

const may = definePermissions("trial", {
  approve: { says: "approve a trial", roles: { lead: "everywhere" } },
});
const input = z.strictObject({ id: z.number().int() });
const event = { kind: { verb: "trial.approved", version: 1, says: "approved" } };

const approve = defineCommand({
  verb: "approveForTrial",
  permission: may.approve,
  input,
  signed: true,
  run: (_ctx, { id }) => ({ result: id, event }),
});
const look = defineQuery({ name: "lookForTrial", permission: may.approve, input, run: (_ctx, { id }) => id });
const wrong = { id: "not a number" as never };

describe("whoever may not", () => {
  it("is told so before what they sent is looked at, whether they ask or act", () => {
    const bench = testBench();
    const reader = bench.person("Ada Finch", ["reader"]);
    expect(() => bench.run(reader, approve, wrong)).toThrow("does not allow you to approve");
    expect(() => bench.ask(reader, look, wrong)).toThrow("does not allow you to approve");
  });

  it("is asked for no password", () => {
    const bench = testBench();
    const reader = bench.person("Ada Finch", ["reader"]);
    const lead = bench.person("Ines Marlow", ["lead"]);
    const unproven = { passwordConfirmed: false };
    expect(() => bench.run(reader, approve, { id: 1 }, unproven)).toThrow("does not allow you to approve");
    expect(() => bench.run(lead, approve, wrong, unproven)).toThrow("must be mended");
    expect(() => bench.run(lead, approve, { id: 1 }, unproven)).toThrow("password");
  });
});
