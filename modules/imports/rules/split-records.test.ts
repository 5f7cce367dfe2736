import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { detectDelimiter } from "@/modules/imports/rules/detect-delimiter";
import { RefusedFile } from "@/modules/imports/rules/refused-file";
import { RecordSplitter, type TextRecord } from "@/modules/imports/rules/split-records";

function split(text: string, pieces = [text.length], delimiter = ","): TextRecord[] {
  const splitter = new RecordSplitter(delimiter);
  const records: TextRecord[] = [];
  let from = 0;
  for (const length of [...pieces, text.length]) {
    records.push(...splitter.push(text.slice(from, from + length)));
    from += length;
  }
  const last = splitter.end();
  return last ? [...records, last] : records;
}

function refusalOf(run: () => unknown) {
  try {
    run();
  } catch (error) {
    if (error instanceof RefusedFile) return error.refusal;
    throw error;
  }
  throw new Error("was not refused");
}

describe("RecordSplitter", () => {
  it("counts lines through line breaks inside quotes and through each kind of line end", () => {
    const records = split('a,b\r\n"x\r\ny",2\n3,4\r5,6');
    expect(records.map(({ line, text }) => [line, text])).toEqual([
      [1, "a,b"],
      [2, '"x\r\ny",2'],
      [4, "3,4"],
      [5, "5,6"],
    ]);
  });

  it("gives the same records however the text arrives", () => {
    const text = fc.stringMatching(/^(?:[a;,]|"(?:[a\r\n,]|""){0,4}"|\r\n|\n|\r){0,30}$/);
    fc.assert(
      fc.property(text, fc.array(fc.integer({ min: 1, max: 5 })), (whole, pieces) => {
        let once: TextRecord[];
        try {
          once = split(whole);
        } catch {
          expect(() => split(whole, pieces)).toThrow(RefusedFile);
          return;
        }
        expect(split(whole, pieces)).toEqual(once);
      }),
    );
  });

  // Source: RFC 4180 section 2 and its grammar: such input is not allowed and must not be repaired silently.
  it("reports quotes that RFC 4180 does not allow", () => {
    expect(split('a"b,c\r\n')[0]?.fault).toBe("stray-quote");
    expect(split('"a"b,c\r\n')[0]?.fault).toBe("text-after-quote");
    expect(split('x,"he said ""hi""",z\r\n')[0]).toMatchObject({ fault: null, fields: 3 });
  });

  it("names the line on which an unclosed quote opens", () => {
    expect(refusalOf(() => split('a,b\r\n1,2\r\n3,"4\r\n5,6\r\n'))).toMatchObject({
      code: "unclosed-quote",
      line: 3,
    });
  });

  it("gives up on an unclosed quote long before the end of a large file", () => {
    const splitter = new RecordSplitter(",");
    splitter.push('a,b\n1,"2\n');
    expect(refusalOf(() => splitter.push("3,4\n".repeat(1100)))).toMatchObject({
      code: "unclosed-quote",
      line: 2,
    });
  });

  it("stops at an endless line, at too many columns and at NUL", () => {
    const endless = () => {
      const splitter = new RecordSplitter(",");
      for (let piece = 0; piece < 1000; piece += 1) splitter.push("x".repeat(64 * 1024));
    };
    expect(refusalOf(endless)).toMatchObject({ code: "line-too-long", line: 1 });
    expect(refusalOf(() => split("a\n" + "1,".repeat(10_000)))).toMatchObject({
      code: "too-many-columns",
      line: 2,
    });
    expect(split("1,".repeat(299))[0]?.fields).toBe(300);
    expect(refusalOf(() => split("a,b\n1,\0\n"))).toMatchObject({ code: "nul-bytes", line: 2 });
  });
});

describe("detectDelimiter", () => {
  it("finds each delimiter", () => {
    for (const delimiter of [",", ";", "\t", "|"]) {
      const sample = `System${delimiter}pH\nKELP-01${delimiter}8.1\nREEF-02${delimiter}8.2\n`;
      expect(detectDelimiter(sample)).toEqual({ delimiter, hasSeparatorLine: false });
    }
  });

  it("is not misled by decimal commas, nor by delimiters inside quotes", () => {
    expect(
      detectDelimiter("System;Date;pH\nKELP-01;2026-03-14;8,1\nREEF-02;2026-03-14;8,2\n").delimiter,
    ).toBe(";");
    expect(detectDelimiter('a,b\n"1;2;3",4\n"5;6;7",8\n').delimiter).toBe(",");
  });

  it("obeys a first line that declares the separator, and takes one column as commas", () => {
    expect(detectDelimiter("sep=|\r\na|b;c;d\r\n")).toEqual({ delimiter: "|", hasSeparatorLine: true });
    expect(detectDelimiter("pH\n8\n7\n").delimiter).toBe(",");
  });
});
