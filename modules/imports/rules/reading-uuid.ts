import { createHash } from "node:crypto";

/** Namespace of the readings that come out of files; made once for this purpose. */
const NAMESPACE = Buffer.from("8c0b6f2e5d1a4e7f9b3c6a2d4f8e1c57", "hex");

/**
 * The UUID of the reading in one cell of one file, the same whenever it is worked out: a restart in the middle of a
 * commit stores nothing twice. Another import of the same bytes (after a withdrawal) gives other readings.
 * Form: name-based UUID, version 5. Source: RFC 9562, 5.5.
 */
export function readingUuid(
  of: { importCode: string; checkRun: number; sha256: string },
  line: number,
  column: number,
): string {
  const name = `${of.importCode}/${of.checkRun}/${of.sha256}/${line}/${column}`;
  const hash = createHash("sha1").update(NAMESPACE).update(name).digest().subarray(0, 16);
  hash.writeUInt8((hash.readUInt8(6) & 0x0f) | 0x50, 6);
  hash.writeUInt8((hash.readUInt8(8) & 0x3f) | 0x80, 8);
  const hex = hash.toString("hex");
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join("-");
}
