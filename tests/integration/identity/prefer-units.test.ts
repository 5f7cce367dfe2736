import { describe, expect, it } from "vitest";
import { getOwnAccount, preferUnits } from "@/modules/identity";
import { testBench } from "../../support/database";

describe("preferred units", () => {
  it("are kept for the person who chose them alone", () => {
    const { run, ask, person } = testBench();
    const [joe, ada] = [person("Joe Okafor", ["aquarist"]), person("Ada Finch", ["reader"])];
    run(joe, preferUnits, { units: { temperature: "°F", alkalinity: "dKH" } });
    expect(ask(joe, getOwnAccount, {})?.preferredUnits).toEqual({ temperature: "°F", alkalinity: "dKH" });
    expect(ask(ada, getOwnAccount, {})?.preferredUnits).toEqual({});
  });

  it("of another kind of quantity are refused", () => {
    const { run, person } = testBench();
    const joe = person("Joe Okafor", ["aquarist"]);
    expect(() => run(joe, preferUnits, { units: { temperature: "dKH" } })).toThrow(
      "not a unit of temperature",
    );
    expect(() => run(joe, preferUnits, { units: { temperature: "°X" } })).toThrow(
      "not a unit of temperature",
    );
  });
});
