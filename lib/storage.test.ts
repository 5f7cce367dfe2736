import { mkdtemp, readdir, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { clearArriving, diskStore, TooLarge } from "./storage";

let folder = "";
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), "storage-"));
});
afterAll(() => rm(folder, { recursive: true }));

async function* pieces(...texts: string[]): AsyncGenerator<Uint8Array> {
  for (const text of texts) yield Buffer.from(text);
}

describe("the store on disk", () => {
  it("knows a file by the SHA-256 of its bytes", async () => {
    const received = await diskStore(folder).receive(pieces("a", "bc"), 10);
    // FIPS 180-2, appendix B.1: the digest of "abc".
    expect(received.sha256).toBe("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
    expect(received.bytes).toBe(3);
    await received.discard();
    expect(await readdir(path.join(folder, "arriving"))).toEqual([]);
  });

  it("keeps what came under its key and gives it back byte for byte", async () => {
    const store = diskStore(folder);
    const received = await store.receive(pieces("water ", "and salt"), 100);
    await received.keep("uploads/one");
    const { stream, bytes } = await store.read("uploads/one");
    expect(bytes).toBe(14);
    expect(Buffer.concat(await stream.toArray()).toString()).toBe("water and salt");
    expect(await store.has("uploads/two")).toBe(false);
  });

  it("refuses one byte too many and leaves nothing behind", async () => {
    const store = diskStore(folder);
    await expect(store.receive(pieces("12345", "67890", "1"), 10)).rejects.toBeInstanceOf(TooLarge);
    expect(await readdir(path.join(folder, "arriving"))).toEqual([]);
    const exact = await store.receive(pieces("12345", "67890"), 10);
    expect(exact.bytes).toBe(10);
    await exact.discard();
  });

  it("never leaves its folder by a key", async () => {
    await expect(diskStore(folder).localPath("../outside").then(String)).rejects.toThrow(RangeError);
  });

  it("clears what was arriving when the process ended", async () => {
    await writeFile(path.join(folder, "arriving", "rest"), "half a file");
    expect(await clearArriving(folder)).toBe(1);
    expect(await clearArriving(folder)).toBe(0);
  });
});
