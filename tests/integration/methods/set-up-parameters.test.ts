import { describe, expect, it } from "vitest";
import {
  addCatalogue,
  createParameter,
  editParameter,
  listCatalogue,
  listParameters,
  retireParameter,
} from "@/modules/methods";
import { PARAMETER_CATALOGUE } from "@/modules/methods/catalogue.data";
import { testBench } from "../../support/database";

const CALCIUM = {
  code: "calcium",
  name: "Calcium",
  kind: "number" as const,
  unit: "mg/L Ca",
  acceptedUnits: ["mg/L Ca", "mmol/L Ca"],
  decimals: "0",
  plausible: { low: "0", high: "1500" },
  group: "ions-and-metals" as const,
};
const changesOf = ({ code: _code, kind: _kind, unit: _unit, ...rest }: typeof CALCIUM) => rest;

function bench() {
  const it = testBench();
  const admin = it.person("Ines Marlow", ["admin"]);
  const list = () => it.ask(admin, listParameters, { includeRetired: true });
  return { ...it, admin, list };
}

const refusal = (act: () => unknown): { code: string; errors: { pointer: string; detail: string }[] } => {
  try {
    act();
  } catch (error) {
    return error as ReturnType<typeof refusal>;
  }
  throw new Error("it was not refused");
};

describe("the starter catalogue", () => {
  it("is added whole, and the second time adds nothing", () => {
    const { run, ask, admin, list } = bench();
    const { added } = run(admin, addCatalogue, {});
    expect(added).toHaveLength(PARAMETER_CATALOGUE.length);
    expect(
      list()
        .map((each) => each.code)
        .sort(),
    ).toEqual(PARAMETER_CATALOGUE.map((each) => each.code).sort());
    expect(ask(admin, listCatalogue, {})).toEqual([]);
    expect(run(admin, addCatalogue, {}).added).toEqual([]);
    expect(list()).toHaveLength(PARAMETER_CATALOGUE.length);
  });

  it("is added in part, and leaves alone what the facility has set up itself", () => {
    const { run, admin, list } = bench();
    run(admin, createParameter, { ...CALCIUM, decimals: 2, plausible: { low: 100, high: 900 } });
    const { added } = run(admin, addCatalogue, { codes: ["calcium", "temperature"] });
    expect(added.map((each) => each.code)).toEqual(["temperature"]);
    expect(list().find((each) => each.code === "calcium")).toMatchObject({
      decimals: 2,
      plausible: { low: 100, high: 900 },
    });
  });

  it("is refused where a named entry is not in it", () => {
    const { run, admin } = bench();
    expect(() => run(admin, addCatalogue, { codes: ["moonlight"] })).toThrow("no parameter moonlight");
  });
});

describe("a parameter", () => {
  it("is set up from what a form sends, numbers with comma or point", () => {
    const { run, admin, list } = bench();
    run(admin, createParameter, { ...CALCIUM, plausible: { low: "0,5", high: "" }, note: "By titration." });
    expect(list()[0]).toMatchObject({
      code: "calcium",
      unit: "mg/L Ca",
      decimals: 0,
      plausible: { low: 0.5, high: null },
      note: "By titration.",
      isRetired: false,
    });
  });

  it("keeps its code, its kind and its unit, and says why", () => {
    const { run, admin, list } = bench();
    const { id } = run(admin, createParameter, CALCIUM);
    const same = { ...changesOf(CALCIUM), parameterId: id };
    const unit = refusal(() => run(admin, editParameter, { ...same, unit: "mmol/L Ca" }));
    expect(unit.errors[0]).toMatchObject({ pointer: "/unit" });
    expect(unit.errors[0]?.detail).toContain("readings may be stored in it already");
    expect(refusal(() => run(admin, editParameter, { ...same, code: "ca" })).errors[0]?.pointer).toBe(
      "/code",
    );
    expect(refusal(() => run(admin, editParameter, { ...same, kind: "text" })).errors[0]?.pointer).toBe(
      "/kind",
    );
    run(admin, editParameter, { ...same, name: "Calcium, dissolved", unit: "mg/L Ca", decimals: 1 });
    expect(list()[0]).toMatchObject({
      name: "Calcium, dissolved",
      code: "calcium",
      unit: "mg/L Ca",
      decimals: 1,
    });
  });

  it("keeps every answer that readings may carry; words and meaning change", () => {
    const { run, admin, list } = bench();
    const clarity = {
      name: "Clarity",
      group: "observation" as const,
      decimals: 0,
      choices: [
        { code: "clear", label: "Clear", means: "within" as const },
        { code: "cloudy", label: "Cloudy", means: "watch" as const },
      ],
    };
    const { id } = run(admin, createParameter, { ...clarity, code: "clarity", kind: "choice", unit: null });
    const fewer = {
      ...clarity,
      parameterId: id,
      choices: [clarity.choices[0], { code: "foul", label: "Foul", means: "out" as const }],
    };
    const refused = refusal(() => run(admin, editParameter, fewer as never));
    expect(refused.errors[0]).toMatchObject({ pointer: "/choices" });
    expect(refused.errors[0]?.detail).toContain("“Cloudy” cannot be taken away");
    const more = clarity.choices.map((choice) =>
      choice.code === "cloudy" ? { ...choice, means: "out" as const } : choice,
    );
    run(admin, editParameter, {
      ...clarity,
      parameterId: id,
      choices: [...more, { code: "foul", label: "Foul", means: "out" }],
    });
    expect(list()[0]?.choices.map((choice) => choice.means)).toEqual(["within", "out", "out"]);
  });

  it("is refused with every fault at once, each under its field", () => {
    const { run, admin } = bench();
    const wrong = refusal(() =>
      run(admin, createParameter, {
        ...CALCIUM,
        acceptedUnits: ["°C"],
        plausible: { low: 9, high: 2 },
        choices: [{ code: "yes", label: "Yes", means: "within" }],
      }),
    );
    expect(wrong.code).toBe("invalid");
    expect(wrong.errors.map((error) => error.pointer).sort()).toEqual(
      ["/acceptedUnits", "/acceptedUnits", "/choices", "/plausible/high"].sort(),
    );
    expect(
      refusal(() =>
        run(admin, createParameter, { ...CALCIUM, unit: "SG 20/20 °C", acceptedUnits: ["SG 20/20 °C"] }),
      ).errors[0],
    ).toMatchObject({ pointer: "/unit" });
    expect(refusal(() => run(admin, createParameter, { ...CALCIUM, decimals: "" })).errors[0]).toMatchObject({
      pointer: "/decimals",
    });
  });

  it("is refused under a code or a name that is taken, in any case of letters", () => {
    const { run, admin } = bench();
    run(admin, createParameter, CALCIUM);
    expect(
      refusal(() => run(admin, createParameter, { ...CALCIUM, code: "Calcium", name: "Other" })).errors[0],
    ).toMatchObject({ pointer: "/code" });
    expect(
      refusal(() => run(admin, createParameter, { ...CALCIUM, code: "ca", name: "CALCIUM" })).errors[0],
    ).toMatchObject({ pointer: "/name" });
  });

  it("is retired with a reason, once, and then neither offered nor changed", () => {
    const { run, ask, admin } = bench();
    const { id } = run(admin, createParameter, CALCIUM);
    expect(refusal(() => run(admin, retireParameter, { parameterId: id, reason: "" })).code).toBe("invalid");
    run(admin, retireParameter, { parameterId: id, reason: "Measured as hardness now" });
    expect(ask(admin, listParameters, {})).toEqual([]);
    expect(refusal(() => run(admin, retireParameter, { parameterId: id, reason: "Again" })).code).toBe(
      "conflict",
    );
    expect(refusal(() => run(admin, editParameter, { ...changesOf(CALCIUM), parameterId: id })).code).toBe(
      "conflict",
    );
  });

  it("is set up by neither aquarist nor auditor", () => {
    const { run, person } = bench();
    for (const role of ["aquarist", "operator", "analyst", "veterinarian", "auditor", "reader"] as const) {
      const someone = person(`Somebody ${role}`, [role]);
      expect(refusal(() => run(someone, createParameter, CALCIUM)).code).toBe("not-allowed");
      expect(refusal(() => run(someone, addCatalogue, {})).code).toBe("not-allowed");
    }
  });
});
