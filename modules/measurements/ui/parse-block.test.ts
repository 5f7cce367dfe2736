import { describe, expect, it } from "vitest";
import { parseBlock } from "./parse-block";

describe("a block from a spreadsheet", () => {
  it("keeps rows and columns, with the line ends of any system and the last one left out", () => {
    const wanted = [
      ["13.4", "34,6"],
      ["12.9", "33.9"],
    ];
    expect(parseBlock("13.4\t34,6\r\n12.9\t33.9\r\n")).toEqual(wanted);
    expect(parseBlock("13.4\t34,6\r12.9\t33.9\r")).toEqual(wanted);
    expect(parseBlock("13.4\t34,6\n12.9\t33.9")).toEqual(wanted);
  });

  it("keeps the place of empty cells and empty rows", () => {
    expect(parseBlock("\t8.1\n\n7.9\t\n")).toEqual([["", "8.1"], [""], ["7.9", ""]]);
  });

  it("reads a quoted cell with a line end or a tab in it as one cell", () => {
    expect(parseBlock('"cloudy\nat noon"\t"a ""b"" c"')).toEqual([["cloudy\nat noon", 'a "b" c']]);
  });

  it("takes a single value", () => {
    expect(parseBlock("<0.05")).toEqual([["<0.05"]]);
  });

  it("holds nothing when nothing was copied, and refuses a whole workbook", () => {
    expect(parseBlock("")).toEqual([]);
    expect(parseBlock(Array.from({ length: 5_001 }, () => "1").join("\n"))).toBeNull();
  });
});
