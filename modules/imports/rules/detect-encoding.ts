import type { TextEncoding } from "@/modules/imports/model";

/** How the bytes of a text file become letters; `bomBytes` are skipped. */
export type EncodingGuess =
  | { kind: "encoding"; encoding: TextEncoding; bomBytes: number }
  | { kind: "nul-bytes" }
  | { kind: "utf-32" };

const startsWith = (head: Uint8Array, ...bytes: number[]): boolean =>
  head.length >= bytes.length && bytes.every((byte, index) => head[index] === byte);

/** Share of zero bytes at even and at odd places: in UTF-16 every other byte of Latin text is zero. */
function zeroShares(head: Uint8Array): { even: number; odd: number } {
  const pairs = Math.floor(head.length / 2);
  let even = 0;
  let odd = 0;
  for (let index = 0; index < pairs * 2; index += 1) {
    if (head[index] !== 0) continue;
    if (index % 2 === 0) even += 1;
    else odd += 1;
  }
  return pairs === 0 ? { even: 0, odd: 0 } : { even: even / pairs, odd: odd / pairs };
}

/**
 * In which encoding is a text file written?
 * A byte order mark decides (Unicode 15, section 23.8: EF BB BF, FF FE, FE FF). Without one: zero bytes at
 * every other place mean UTF-16, any other zero byte is no text, valid UTF-8 is UTF-8, the rest Windows-1252.
 * @param head the first bytes of the file (some thousands are plenty)
 * @param wholeFile what a pass over all bytes has shown, see `Utf8Check`
 */
export function detectEncoding(
  head: Uint8Array,
  wholeFile: { isUtf8: boolean; hasNul: boolean },
): EncodingGuess {
  if (startsWith(head, 0xff, 0xfe, 0, 0) || startsWith(head, 0, 0, 0xfe, 0xff)) return { kind: "utf-32" };
  if (startsWith(head, 0xef, 0xbb, 0xbf)) {
    if (wholeFile.hasNul) return { kind: "nul-bytes" };
    return { kind: "encoding", encoding: wholeFile.isUtf8 ? "utf-8" : "windows-1252", bomBytes: 3 };
  }
  if (startsWith(head, 0xff, 0xfe)) return { kind: "encoding", encoding: "utf-16le", bomBytes: 2 };
  if (startsWith(head, 0xfe, 0xff)) return { kind: "encoding", encoding: "utf-16be", bomBytes: 2 };
  if (wholeFile.hasNul) {
    const { even, odd } = zeroShares(head);
    if (odd > 0.4 && even < 0.1) return { kind: "encoding", encoding: "utf-16le", bomBytes: 0 };
    if (even > 0.4 && odd < 0.1) return { kind: "encoding", encoding: "utf-16be", bomBytes: 0 };
    return { kind: "nul-bytes" };
  }
  return { kind: "encoding", encoding: wholeFile.isUtf8 ? "utf-8" : "windows-1252", bomBytes: 0 };
}

/** Looks at a file's bytes piece by piece: is all of it valid UTF-8 (RFC 3629), and is there a zero byte? */
export class Utf8Check {
  readonly #decoder = new TextDecoder("utf-8", { fatal: true, ignoreBOM: true });
  #isValid = true;
  #hasNul = false;

  push(bytes: Uint8Array): void {
    this.#hasNul ||= bytes.includes(0);
    if (this.#isValid) this.#decode(bytes, true);
  }

  /** What the whole file was; call once, at its end. */
  end(): { isUtf8: boolean; hasNul: boolean } {
    if (this.#isValid) this.#decode(new Uint8Array(0), false);
    return { isUtf8: this.#isValid, hasNul: this.#hasNul };
  }

  #decode(bytes: Uint8Array, stream: boolean): void {
    try {
      this.#decoder.decode(bytes, { stream });
    } catch {
      this.#isValid = false;
    }
  }
}
