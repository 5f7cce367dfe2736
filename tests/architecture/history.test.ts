import { existsSync, readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { EVENT_TABLES, saidOf } from "@/app/_server/all-events";

describe("the words of the history", () => {
  const events = EVENT_TABLES.flatMap((table) => Object.values(table.events));

  it("hold every verb of every module, each once", () => {
    const verbs = events.map((event) => event.verb);
    expect(new Set(verbs).size).toBe(verbs.length);
    const defined = readdirSync("modules")
      .map((name) => `modules/${name}/events.ts`)
      .filter((file) => existsSync(file))
      .flatMap((file) =>
        [...readFileSync(file, "utf8").matchAll(/\["([a-z-]+\.[a-z-]+)", \d+,/g)].map((found) => found[1]),
      );
    expect(defined.length).toBeGreaterThan(50);
    expect(defined.filter((verb) => !verbs.includes(verb ?? ""))).toEqual([]);
  });

  it("follow a person's name: “Ines Marlow corrected a reading”", () => {
    for (const { verb, says } of events) expect(says, verb).toMatch(/^[a-z][^.]*$/);
    expect(saidOf("reading.corrected")).toBe("corrected a reading");
    expect(saidOf("of.nobody")).toBe("of.nobody");
  });
});
