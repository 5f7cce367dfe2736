import fc from "fast-check";
import { expect, it } from "vitest";
import { parseValue } from "@/modules/imports/rules/parse-number";
import { plainValueText } from "@/modules/imports/rules/value-text";

it("writes values of every file in one way", () => {
  const plain = (text: string) => {
    const found = parseValue(text, "comma");
    return found.kind === "value" ? plainValueText(found.value) : found.kind;
  };
  expect(["8,12", "< 0,05", ">200", "1.234,5", "n.d.", "TNTC", "clear"].map(plain)).toEqual([
    "8.12",
    "<0.05",
    ">200",
    "1234.5",
    "ND",
    "TNTC",
    "clear",
  ]);
});

it("writes every number so that it reads back as the same number", () => {
  const number = fc.double({ noNaN: true, noDefaultInfinity: true }).map((value) => value || 0);
  fc.assert(
    fc.property(number, fc.constantFrom("<", ">", null), (value, relation) => {
      const written = { kind: "number", number: value, relation, qualifier: null } as const;
      expect(parseValue(plainValueText(written), "point")).toEqual({ kind: "value", value: written });
    }),
  );
});
