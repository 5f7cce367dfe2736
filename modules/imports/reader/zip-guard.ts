import { createReadStream } from "node:fs";
import { type FileHandle, open } from "node:fs/promises";
import { pipeline } from "node:stream";
import { crc32, createInflateRaw } from "node:zlib";
import { IMPORT_LIMITS } from "@/modules/imports/model";
import { RefusedFile, refuseFile } from "@/modules/imports/rules/refused-file";

/** One file inside a zip archive, as its central directory declares it. Sizes in bytes. */
export type ZipEntry = {
  name: string;
  method: number;
  crc: number;
  compressedSize: number;
  inflatedSize: number;
  offset: number;
};

const END = 0x06054b50;
const END_64 = 0x06064b50;
const END_64_LOCATOR = 0x07064b50;
const CENTRAL = 0x02014b50;
const LOCAL = 0x04034b50;
const MAX_DIRECTORY_BYTES = 16 * 1024 * 1024;
const MB = 1024 * 1024;

export function damaged(detail: string): RefusedFile {
  return refuseFile(
    "damaged-workbook",
    `The workbook cannot be read: ${detail}.`,
    "Open it in a spreadsheet program and save it again as .xlsx.",
  );
}

function bomb(detail: string): RefusedFile {
  return refuseFile(
    "zip-bomb",
    `The workbook is not opened, because ${detail}.`,
    "Check where the file comes from; if it is right, save the table as CSV and import that.",
  );
}

async function bytesAt(file: FileHandle, offset: number, length: number): Promise<Buffer> {
  const buffer = Buffer.alloc(length);
  const { bytesRead } = await file.read(buffer, 0, length, offset);
  if (bytesRead !== length) throw damaged("it ends too early");
  return buffer;
}

type Directory = { entries: number; size: number; offset: number };

/** Finds where the archive lists its files (APPNOTE.TXT 4.3.16; 4.3.14 for large archives). */
async function findDirectory(file: FileHandle, fileBytes: number): Promise<Directory> {
  const tailBytes = Math.min(fileBytes, 22 + 65_535);
  const tail = await bytesAt(file, fileBytes - tailBytes, tailBytes);
  let at = tail.length - 22;
  while (at >= 0 && tail.readUInt32LE(at) !== END) at -= 1;
  if (at < 0) throw damaged("its table of contents is missing");
  const found = {
    entries: tail.readUInt16LE(at + 10),
    size: tail.readUInt32LE(at + 12),
    offset: tail.readUInt32LE(at + 16),
  };
  const isLarge = found.entries === 0xffff || found.size === 0xffffffff || found.offset === 0xffffffff;
  if (!isLarge || at < 20 || tail.readUInt32LE(at - 20) !== END_64_LOCATOR) return found;
  const end = await bytesAt(file, Number(tail.readBigUInt64LE(at - 12)), 56);
  if (end.readUInt32LE(0) !== END_64) throw damaged("its table of contents is missing");
  return {
    entries: Number(end.readBigUInt64LE(32)),
    size: Number(end.readBigUInt64LE(40)),
    offset: Number(end.readBigUInt64LE(48)),
  };
}

/** Sizes beyond 32 bits stand in an extra field (APPNOTE.TXT 4.5.3), in this order, each only where it is needed. */
function withLargeSizes(entry: ZipEntry, extra: Buffer): ZipEntry {
  let at = 0;
  while (at + 4 <= extra.length) {
    const length = extra.readUInt16LE(at + 2);
    if (extra.readUInt16LE(at) === 1) {
      const field = extra.subarray(at + 4, at + 4 + length);
      let from = 0;
      const wide = (value: number): number => {
        if (value !== 0xffffffff || from + 8 > field.length) return value;
        from += 8;
        return Number(field.readBigUInt64LE(from - 8));
      };
      const inflatedSize = wide(entry.inflatedSize);
      const compressedSize = wide(entry.compressedSize);
      return { ...entry, inflatedSize, compressedSize, offset: wide(entry.offset) };
    }
    at += 4 + length;
  }
  return entry;
}

function parseEntries(directory: Buffer, count: number): ZipEntry[] {
  const entries: ZipEntry[] = [];
  let at = 0;
  for (let index = 0; index < count; index += 1) {
    if (at + 46 > directory.length || directory.readUInt32LE(at) !== CENTRAL)
      throw damaged("its table of contents is cut");
    const nameEnd = at + 46 + directory.readUInt16LE(at + 28);
    const extraEnd = nameEnd + directory.readUInt16LE(at + 30);
    if ((directory.readUInt16LE(at + 8) & 1) === 1) {
      throw refuseFile(
        "encrypted-workbook",
        "The workbook is encrypted.",
        "Take the password off and save it again.",
      );
    }
    const entry: ZipEntry = {
      name: directory.toString("utf8", at + 46, nameEnd),
      method: directory.readUInt16LE(at + 10),
      crc: directory.readUInt32LE(at + 16),
      compressedSize: directory.readUInt32LE(at + 20),
      inflatedSize: directory.readUInt32LE(at + 24),
      offset: directory.readUInt32LE(at + 42),
    };
    entries.push(withLargeSizes(entry, directory.subarray(nameEnd, extraEnd)));
    at = extraEnd + directory.readUInt16LE(at + 32);
  }
  return entries;
}

function checkDeclared(entries: ZipEntry[], fileBytes: number): void {
  const inflated = entries.reduce((sum, entry) => sum + entry.inflatedSize, 0);
  if (inflated > IMPORT_LIMITS.inflatedBytes) {
    throw bomb(
      `it would unpack to ${Math.ceil(inflated / MB)} MB; at most ${IMPORT_LIMITS.inflatedBytes / MB} MB are read`,
    );
  }
  const ratio = inflated / fileBytes;
  if (ratio > IMPORT_LIMITS.inflationRatio) {
    throw bomb(`it would unpack to ${Math.round(ratio)} times its size, far more than a real table does`);
  }
  const names = new Set(entries.map((entry) => entry.name));
  if (names.size !== entries.length) throw damaged("it lists a part twice");
}

/**
 * A zip archive that is never trusted: what it declares is checked before anything is unpacked, and what it
 * unpacks to is counted against that while it is read. Parts are found by the central directory alone.
 */
export class GuardedZip {
  readonly #path: string;
  readonly #entries: ReadonlyMap<string, ZipEntry>;
  #inflated = 0;

  private constructor(path: string, entries: ZipEntry[]) {
    this.#path = path;
    this.#entries = new Map(entries.map((entry) => [entry.name, entry]));
  }

  /** @throws RefusedFile when the archive is damaged, encrypted, or declares more than is allowed */
  static async open(path: string): Promise<GuardedZip> {
    const file = await open(path, "r");
    try {
      const { size } = await file.stat();
      const directory = await findDirectory(file, size);
      if (directory.entries > IMPORT_LIMITS.zipEntries) {
        throw bomb(`it holds ${directory.entries} parts; at most ${IMPORT_LIMITS.zipEntries} are read`);
      }
      if (directory.size > MAX_DIRECTORY_BYTES)
        throw bomb("its table of contents is larger than any real one");
      const entries = parseEntries(await bytesAt(file, directory.offset, directory.size), directory.entries);
      checkDeclared(entries, size);
      return new GuardedZip(path, entries);
    } finally {
      await file.close();
    }
  }

  names(): string[] {
    return [...this.#entries.keys()];
  }

  has(name: string): boolean {
    return this.#entries.has(name);
  }

  inflatedSize(name: string): number {
    return this.#entries.get(name)?.inflatedSize ?? 0;
  }

  /** The unpacked bytes of one part. @throws RefusedFile when it is missing, damaged or larger than declared */
  async *read(name: string): AsyncGenerator<Buffer> {
    const entry = this.#entries.get(name);
    if (!entry) throw damaged(`the part ${name} is missing`);
    if (entry.method !== 0 && entry.method !== 8)
      throw damaged("it is compressed in a way that is not known here");
    let bytes = 0;
    let crc = 0;
    for await (const piece of inflate(this.#path, entry, await this.#dataOffset(entry))) {
      bytes += piece.length;
      this.#inflated += piece.length;
      if (bytes > entry.inflatedSize) throw bomb("it unpacks to more than it declares");
      if (this.#inflated > IMPORT_LIMITS.inflatedBytes) throw bomb("it unpacks to more than is allowed");
      crc = crc32(piece, crc);
      yield piece;
    }
    if (bytes !== entry.inflatedSize || crc !== entry.crc) throw damaged(`the part ${name} is not whole`);
  }

  async #dataOffset(entry: ZipEntry): Promise<number> {
    const file = await open(this.#path, "r");
    try {
      const header = await bytesAt(file, entry.offset, 30);
      if (header.readUInt32LE(0) !== LOCAL) throw damaged("its table of contents points to nothing");
      return entry.offset + 30 + header.readUInt16LE(26) + header.readUInt16LE(28);
    } finally {
      await file.close();
    }
  }
}

async function* inflate(path: string, entry: ZipEntry, start: number): AsyncGenerator<Buffer> {
  if (entry.compressedSize === 0) return;
  const packed = createReadStream(path, {
    start,
    end: start + entry.compressedSize - 1,
    highWaterMark: 64 * 1024,
  });
  const stream =
    entry.method === 8 ? pipeline(packed, createInflateRaw({ chunkSize: 64 * 1024 }), () => {}) : packed;
  try {
    for await (const piece of stream) yield piece as Buffer;
  } catch (cause) {
    if (cause instanceof RefusedFile) throw cause;
    throw damaged(`the part ${entry.name} cannot be unpacked`);
  } finally {
    packed.destroy();
  }
}
