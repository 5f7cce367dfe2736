import fc from "fast-check";
import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { csvField, csvLine, isDangerousCsvText, unescapeCsvText, writeCsv } from "@/lib/csv";

describe("csvField", () => {
  // Source: OWASP, "CSV Injection", the two worked examples of the page.
  it("escapes formulas as the OWASP examples do", () => {
    expect(csvField('=1+2";=1+2')).toBe('"\'=1+2"";=1+2"');
    expect(csvField("=1+2'\" ;,=1+2")).toBe('"\'=1+2\'"" ;,=1+2"');
  });

  // Source: OWASP, "CSV Injection": = + - @ TAB CR LF; a leading space is our own caution.
  it("escapes each sign that can begin a formula", () => {
    for (const text of ["=SUM(A1)", "+1", "-0.3", "@cmd", "\t=1", "\r=1", "\n=1", " =1", "-", "＝1"]) {
      expect(csvField(text)).toBe(`"'${text}"`);
    }
    expect(["safe", "pH 7.8", "1;=2", ""].map(isDangerousCsvText)).toEqual([false, false, false, false]);
  });

  it("leaves numbers numbers, negative ones too", () => {
    expect([-0.3, 8.12, 0, -0].map((value) => csvField(value))).toEqual(["-0.3", "8.12", "0", "0"]);
    expect(csvField(-0.3, { delimiter: ";", decimal: "comma" })).toBe("-0,3");
  });

  it("refuses what is no number and a decimal comma between commas", () => {
    expect(() => csvField(Number.NaN)).toThrow(RangeError);
    expect(() => csvField(1.5, { decimal: "comma" })).toThrow(RangeError);
  });

  // Source: RFC 4180 section 2, rules 5 to 7.
  it("quotes delimiters, line breaks and quotes", () => {
    expect(csvField('he said "hi"')).toBe('"he said ""hi"""');
    expect(csvField("a\r\nb")).toBe('"a\r\nb"');
    expect(csvField("a,b")).toBe('"a,b"');
    expect(csvField("21 °C")).toBe("21 °C");
  });
});

describe("writeCsv", () => {
  it("ends each record with CR LF and writes a lone empty cell visibly", () => {
    expect(writeCsv(["a"], [[""], [1]])).toBe('a\r\n""\r\n1\r\n');
  });

  it("refuses a row that does not fit its header", () => {
    expect(() => writeCsv(["a", "b"], [["1"]])).toThrow(RangeError);
  });

  it("is read back cell for cell by another parser, the escape taken off", () => {
    const cell = fc.oneof(fc.string({ unit: "grapheme" }), fc.stringMatching(/^['=+\-@\t\r\n ;,|"a]{0,6}$/));
    fc.assert(
      fc.property(
        fc.constantFrom(",", ";", "\t", "|"),
        fc.array(fc.tuple(cell, cell, cell), { minLength: 1 }),
        (delimiter, rows) => {
          const text = rows.map((row) => csvLine(row, { delimiter: delimiter as "," })).join("");
          const { data } = Papa.parse<string[]>(text, { delimiter, newline: "\r\n" });
          expect(data.slice(0, -1).map((row) => row.map(unescapeCsvText))).toEqual(rows);
        },
      ),
    );
  });

  it("never lets a text begin a formula after quotes are taken off", () => {
    fc.assert(
      fc.property(fc.stringMatching(/^['=+\-@\t\r\n ;,|"a]{0,6}$/), (text) => {
        const { data } = Papa.parse<string[]>(csvLine([text]), { delimiter: ",", newline: "\r\n" });
        expect(data[0]?.[0] ?? "").not.toMatch(/^\s*[=+\-@\t\r\n]/);
      }),
    );
  });
});
