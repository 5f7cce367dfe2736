import { execFile } from "node:child_process";
import { rename } from "node:fs/promises";
import path from "node:path";
import { promisify } from "node:util";
import { readerScript } from "@/modules/imports/reader/open-reader";

let building: Promise<void> | null = null;

async function build(): Promise<void> {
  const own = `${readerScript()}.${process.pid}.mjs`;
  await promisify(execFile)(process.execPath, [path.resolve("scripts/build-reader.mjs"), own]);
  await rename(own, readerScript());
}

/** Bundles the reading process from the sources as they are, once a test file; tests beside each other do not meet half of it. */
export function buildReader(): Promise<void> {
  building ??= build();
  return building;
}
