import { createHash, randomUUID } from "node:crypto";
import { createReadStream, createWriteStream } from "node:fs";
import { access, mkdir, open, readdir, rename, rm, stat } from "node:fs/promises";
import path from "node:path";
import { Readable, Transform } from "node:stream";
import { pipeline } from "node:stream/promises";

/** Something larger than the store was told to take. */
export class TooLarge extends Error {
  constructor(readonly maxBytes: number) {
    super(`more than ${maxBytes} bytes were sent`);
    this.name = "TooLarge";
  }
}

/** Bytes that have arrived whole and are not yet kept under a key. One of `keep` and `discard` must be called. */
export type ReceivedObject = {
  readonly sha256: string;
  readonly bytes: number;
  /** Where the bytes lie meanwhile, to be looked at. */
  readonly localPath: string;
  /** Keeps them under a key; what lies there already is the same content and stays. */
  keep(key: string): Promise<void>;
  discard(): Promise<void>;
};

/** A place for files that are kept as they came. Keys are relative, such as `uploads/3f…`. */
export type ObjectStore = {
  /** Takes a stream to its end, hashing it on the way. @throws TooLarge */
  receive(from: AsyncIterable<Uint8Array>, maxBytes: number): Promise<ReceivedObject>;
  has(key: string): Promise<boolean>;
  /** @throws Error when there is nothing under the key */
  read(key: string): Promise<{ stream: Readable; bytes: number }>;
  /** A path on this machine under which another process can read it. */
  localPath(key: string): Promise<string>;
};

const ARRIVING = "arriving";
const KEY = /^[a-z0-9][a-z0-9/_-]*$/;

/** A store in a folder of this machine. */
export function diskStore(folder: string): ObjectStore {
  const at = (key: string): string => {
    if (!KEY.test(key)) throw new RangeError(`"${key}" is not a key of the store`);
    return path.join(folder, key);
  };
  return {
    receive: (from, maxBytes) => receive(path.join(folder, ARRIVING), from, maxBytes, at),
    has: async (key) => exists(at(key)),
    async read(key) {
      const { size } = await stat(at(key));
      return { stream: createReadStream(at(key)), bytes: size };
    },
    localPath: async (key) => at(key),
  };
}

/** Throws away what was still arriving when the process ended. Called once at start-up. */
export async function clearArriving(folder: string): Promise<number> {
  const where = path.join(folder, ARRIVING);
  const names = (await exists(where)) ? await readdir(where) : [];
  for (const name of names) await rm(path.join(where, name), { force: true });
  return names.length;
}

async function receive(
  arriving: string,
  from: AsyncIterable<Uint8Array>,
  maxBytes: number,
  at: (key: string) => string,
): Promise<ReceivedObject> {
  await mkdir(arriving, { recursive: true });
  const localPath = path.join(arriving, randomUUID());
  const hash = createHash("sha256");
  let bytes = 0;
  const measure = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      bytes += chunk.length;
      if (bytes > maxBytes) return done(new TooLarge(maxBytes));
      hash.update(chunk);
      done(null, chunk);
    },
  });
  const discard = () => rm(localPath, { force: true });
  try {
    await pipeline(Readable.from(from), measure, createWriteStream(localPath, { flush: true }));
  } catch (error) {
    await discard();
    throw error;
  }
  const keep = async (key: string) => {
    const target = at(key);
    if (await exists(target)) return discard();
    await mkdir(path.dirname(target), { recursive: true });
    await rename(localPath, target);
    await syncFolder(path.dirname(target));
  };
  return { sha256: hash.digest("hex"), bytes, localPath, keep, discard };
}

/** A rename outlives a power cut once the folder is written. */
async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, "r");
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function exists(file: string): Promise<boolean> {
  try {
    await access(file);
    return true;
  } catch {
    return false;
  }
}
