import { createHash } from "node:crypto";
import { createReadStream } from "node:fs";
import { stat } from "node:fs/promises";
import { IMPORT_LIMITS } from "@/modules/imports/model";
import { Utf8Check } from "@/modules/imports/rules/detect-encoding";
import { refuseFile } from "@/modules/imports/rules/refused-file";

/** What one pass over the bytes shows. */
export type FileFacts = { sha256: string; bytes: number; head: Buffer; isUtf8: boolean; hasNul: boolean };

const HEAD_BYTES = 64 * 1024;
const MB = 1024 * 1024;

/**
 * Reads a file once from end to end, in pieces: hash, size, first bytes, whether all of it is UTF-8.
 * @throws RefusedFile when it is empty or larger than allowed
 */
export async function inspectFile(
  path: string,
  maxBytes: number = IMPORT_LIMITS.fileBytes,
): Promise<FileFacts> {
  const { size } = await stat(path);
  if (size === 0)
    throw refuseFile("empty-file", "The file is empty.", "Choose the file that holds the readings.");
  if (size > maxBytes) {
    throw refuseFile(
      "too-large",
      `The file has ${Math.ceil(size / MB)} MB; at most ${Math.floor(maxBytes / MB)} MB can be read.`,
      "Split it, by month for example, and import the parts one after the other.",
    );
  }
  const hash = createHash("sha256");
  const check = new Utf8Check();
  const head: Buffer[] = [];
  let bytes = 0;
  for await (const piece of createReadStream(path, { highWaterMark: 256 * 1024 })) {
    const data = piece as Buffer;
    hash.update(data);
    check.push(data);
    if (bytes < HEAD_BYTES) head.push(data.subarray(0, HEAD_BYTES - bytes));
    bytes += data.length;
  }
  return { sha256: hash.digest("hex"), bytes, head: Buffer.concat(head), ...check.end() };
}
