import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { root } from "../../scripts/installed.mjs";

const METHODS = ["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE", "OPTIONS"];

/** The address a file of app/ answers at: route groups left out. */
export function addressOf(file: string): string {
  const parts = path
    .dirname(file)
    .split(path.sep)
    .filter((part) => part !== "." && !/^\(.*\)$/.test(part));
  return `/${parts.join("/")}`;
}

function filesNamed(name: RegExp): string[] {
  return readdirSync(path.join(root, "app"), { recursive: true, encoding: "utf8" })
    .filter((file) => name.test(path.basename(file)))
    .sort();
}

/**
 * The methods that the text of a route file exports, in whichever way it is written.
 * @throws Error where they cannot be told from the text, so that none is overlooked
 */
export function methodsOf(text: string): string[] {
  if (/export\s*\*|export\s+const\s*[{[]/.test(text)) throw new Error("write a route's methods out by name");
  const found = new Set<string>();
  for (const [, name] of text.matchAll(/export\s+(?:const|let|var|(?:async\s+)?function)\s+(\w+)/g)) {
    if (name !== undefined && METHODS.includes(name)) found.add(name);
  }
  for (const [, list = ""] of text.matchAll(/export\s*\{([^}]*)\}/g)) {
    for (const item of list.split(",")) {
      const name =
        item
          .trim()
          .split(/\s+as\s+/)
          .at(-1)
          ?.trim() ?? "";
      if (METHODS.includes(name)) found.add(name);
    }
  }
  if (found.size === 0) throw new Error("a route without a method");
  return [...found].sort();
}

/** Every page there is, by its address. */
export const pageAddresses = (): string[] => filesNamed(/^page\.(?:tsx?|jsx?|mdx?)$/).map(addressOf);

/** Every route of the interface, by its address, with its methods. */
export function routeMethods(): Map<string, string[]> {
  const files = filesNamed(/^route\.(?:tsx?|jsx?)$/);
  return new Map(
    files.map((file) => [addressOf(file), methodsOf(readFileSync(path.join(root, "app", file), "utf8"))]),
  );
}
