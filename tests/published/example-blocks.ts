/** One `@example` of a doc comment. */
export interface Example {
  /** as written, on one line */
  text: string;
  /** where it begins */
  line: number;
  expression: string;
  expected: string;
  /** set when it is not of the form `expression // => value` */
  malformed?: true;
}

const COMMENT = /\/\*\*[\s\S]*?\*\//g;
const FORM = /^(?<expression>.+?)\s*\/\/ => (?<expected>\S.*)$/;

/** All examples of a source text, in order; those that are not of the right form are marked, never left out. */
export function examplesIn(source: string): Example[] {
  return [...source.matchAll(COMMENT)].flatMap((comment) =>
    examplesOfComment(comment[0], lineAt(source, comment.index)),
  );
}

const lineAt = (source: string, index: number) => source.slice(0, index).split("\n").length;

function examplesOfComment(comment: string, firstLine: number): Example[] {
  const lines = comment
    .replace(/^\/\*\*/, "")
    .replace(/\*\/$/, "")
    .split("\n")
    .map((line) => line.replace(/^\s*\* ?/, ""));
  const starts = lines.flatMap((line, i) => (/^\s*@example\b/.test(line) ? [i] : []));
  return starts.map((start) => {
    const after = lines.slice(start + 1).findIndex((line) => /^\s*@\w/.test(line));
    const block = lines.slice(start, after < 0 ? undefined : start + 1 + after);
    return read(block.join(" "), firstLine + start);
  });
}

function read(block: string, line: number): Example {
  const text = block
    .replace(/^\s*@example\b/, "")
    .replace(/\s+/g, " ")
    .trim();
  const found = FORM.exec(text)?.groups;
  if (!found?.expression || !found.expected || found.expression.startsWith("//")) {
    return { text, line, expression: "", expected: "", malformed: true };
  }
  return { text, line, expression: found.expression, expected: found.expected };
}

const NUMBER = /-?\d+(?:\.(?<decimals>\d+))?(?:e(?<exponent>[+-]?\d+))?/y;

/** Half of the last printed digit; an integer is meant exactly. */
function toleranceOf(printed: string): number {
  NUMBER.lastIndex = 0;
  const { decimals = "", exponent = "0" } = NUMBER.exec(printed)?.groups ?? {};
  if (decimals === "") return 0;
  return 0.5 * 10 ** (Number(exponent) - decimals.length) * (1 + 1e-9);
}

/** Whether a value is what was printed: numbers to the printed digits, all else exactly. */
export function matches(got: unknown, printed: string): boolean {
  const text = printed.trim();
  if (/^-?\d/.test(text)) {
    if (typeof got !== "number") return false;
    const difference = Math.abs(got - Number(text));
    return difference <= toleranceOf(text) || difference <= 4 * Number.EPSILON * Math.abs(got);
  }
  if (text.startsWith("[")) {
    const parts = split(text);
    return (
      Array.isArray(got) && got.length === parts.length && parts.every((part, i) => matches(got[i], part))
    );
  }
  if (text.startsWith("{")) return matchesObject(got, text);
  if (text === "undefined") return got === undefined;
  return Object.is(got, JSON.parse(text));
}

function matchesObject(got: unknown, text: string): boolean {
  if (typeof got !== "object" || got === null) return false;
  const pairs = split(text).map((part) => {
    const colon = part.indexOf(":");
    return [part.slice(0, colon).trim().replace(/^"|"$/g, ""), part.slice(colon + 1)] as const;
  });
  const entries = new Map(Object.entries(got));
  return (
    entries.size === pairs.length &&
    pairs.every(([key, value]) => entries.has(key) && matches(entries.get(key), value))
  );
}

/** Parts of a printed list or object, split at the commas of its own level. */
function split(text: string): string[] {
  const parts: string[] = [];
  let depth = 0;
  let quoted = false;
  let part = "";
  for (const char of text.slice(1, -1)) {
    if (char === '"') quoted = !quoted;
    if (!quoted && (char === "[" || char === "{")) depth += 1;
    if (!quoted && (char === "]" || char === "}")) depth -= 1;
    if (char === "," && depth === 0 && !quoted) {
      parts.push(part);
      part = "";
    } else part += char;
  }
  if (part.trim() !== "") parts.push(part);
  return parts;
}

export function explain(got: unknown, printed: string): string {
  return `printed ${printed}, got ${typeof got === "object" ? JSON.stringify(got) : String(got)}`;
}
