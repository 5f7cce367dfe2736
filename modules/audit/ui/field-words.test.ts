import { describe, expect, it } from "vitest";
import { fieldChanges, fieldWord, tableWord, valueKind } from "./field-words";

describe("the words of the history", () => {
  it("call tables and columns by what they are", () => {
    expect(tableWord("measurements_limit_version")).toBe("limit version");
    expect(fieldWord("point_id")).toBe("point");
    expect(fieldWord("volume_l")).toBe("volume (L)");
    expect(fieldWord("taken_at")).toBe("taken at");
  });

  it("tell moments, people, records, answers and laid-out data apart", () => {
    expect(valueKind("taken_at", 1_772_442_000_000)).toBe("moment");
    expect(valueKind("fell_on", "2026-03-02")).toBe("day");
    expect(valueKind("entered_by", 3)).toBe("person");
    expect(valueKind("person_id", 3)).toBe("person");
    expect(valueKind("point_id", 3)).toBe("reference");
    expect(valueKind("is_default", 1)).toBe("yes-no");
    expect(valueKind("bounds", '{"toleranceHigh":18}')).toBe("data");
    expect(valueKind("note", "[not json")).toBe("plain");
    expect(valueKind("value", 0)).toBe("plain");
    expect(valueKind("voided_at", null)).toBe("nothing");
  });

  it("show a field that vanished or came as well as one that changed", () => {
    const changes = fieldChanges({ value: 81.2, note: "a", old: 1 }, { value: 8.12, note: "a", fresh: 2 });
    expect(changes.filter((change) => change.differs).map((change) => change.name)).toEqual([
      "value",
      "fresh",
      "old",
    ]);
    expect(changes.find((change) => change.name === "note")?.differs).toBe(false);
  });

  it("show every field that holds something when a row came or went", () => {
    expect(
      fieldChanges(null, { id: 1, note: null })
        .filter((one) => one.differs)
        .map((one) => one.name),
    ).toEqual(["id"]);
    expect(fieldChanges({ id: 1 }, null)[0]).toMatchObject({ before: 1, after: null, differs: true });
  });
});
