import { describe, expect, it } from "vitest";
import { detectEncoding, Utf8Check } from "@/modules/imports/rules/detect-encoding";

const bytes = (hex: string) => Uint8Array.from(Buffer.from(hex, "hex"));

function guess(data: Uint8Array) {
  const check = new Utf8Check();
  check.push(data);
  return detectEncoding(data, check.end());
}

function decode(data: Uint8Array): string {
  const found = guess(data);
  if (found.kind !== "encoding") throw new Error(found.kind);
  return new TextDecoder(found.encoding, { ignoreBOM: true }).decode(data.subarray(found.bomBytes));
}

describe("detectEncoding", () => {
  // Source: The Unicode Standard, 23.8 (byte order marks); RFC 3629 (UTF-8). Bytes as in the reference's table.
  it("reads each encoding and keeps the byte order mark off the first header", () => {
    expect(decode(bytes("efbbbf70483b372c38"))).toBe("pH;7,8");
    expect(decode(bytes("fffe700048003b0037002c003800"))).toBe("pH;7,8");
    expect(decode(bytes("feff00700048003b0037002c0038"))).toBe("pH;7,8");
    expect(decode(bytes("b0433b32312c35"))).toBe("°C;21,5");
    expect(decode(bytes("c2b0433b32312c35"))).toBe("°C;21,5");
  });

  it("finds UTF-16 that has no mark by its zero bytes", () => {
    expect(guess(Buffer.from("System;pH\r\n", "utf16le"))).toMatchObject({
      encoding: "utf-16le",
      bomBytes: 0,
    });
    expect(guess(Buffer.from("System;pH\r\n", "utf16le").swap16())).toMatchObject({ encoding: "utf-16be" });
  });

  it("takes other zero bytes for damage", () => {
    expect(guess(Buffer.from("System;pH\r\nKELP-01;\0\r\n"))).toEqual({ kind: "nul-bytes" });
    expect(guess(bytes("fffe000070000000"))).toEqual({ kind: "utf-32" });
  });

  it("takes a Windows-1252 sign far into the file seriously", () => {
    const head = Buffer.from("a".repeat(5000));
    const check = new Utf8Check();
    check.push(head);
    check.push(bytes("b043"));
    expect(detectEncoding(head, check.end())).toMatchObject({ encoding: "windows-1252" });
  });

  it("does not mistake a letter cut between two pieces for damage", () => {
    const check = new Utf8Check();
    check.push(bytes("41c2"));
    check.push(bytes("b043"));
    expect(check.end()).toEqual({ isUtf8: true, hasNul: false });
    const cut = new Utf8Check();
    cut.push(bytes("41c2"));
    expect(cut.end().isUtf8).toBe(false);
  });
});
