import type { ParameterKind, Qualifier, ReadingValue } from "../model";
import { type DecimalSeparator, parseNumber, tidy } from "./parse-number";

/** What parsing needs to know of a parameter. */
export interface ValueShape {
  readonly kind: ParameterKind;
  readonly choices?: readonly { readonly code: string; readonly label: string }[];
}

export type ParseProblemCode =
  | "empty"
  | "not-a-number"
  | "ambiguous"
  | "too-large"
  | "not-whole"
  | "negative-count"
  | "not-an-answer"
  | "too-long"
  | "control-characters";

export type ParsedValue =
  | ({ readonly ok: true } & ReadingValue)
  | { readonly ok: false; readonly code: ParseProblemCode; readonly sentence: string };

const LONGEST_TEXT = 2000;
const LONGEST_NUMBER = 60;
const NOT_DETECTED = /^(nd|n\.\s?d\.?|n\/d|not detected|none detected|bdl|<\s?(lod|mdl|dl))$/i;
const BELOW_UNKNOWN = /^(<\s?loq|bql|below quantification)$/i;
const TOO_MANY = /^(tntc|t\.n\.t\.c\.|too numerous to count|confluent)$/i;
const YES = new Set(["yes", "y", "true", "1", "on", "✓"]);
const NO = new Set(["no", "n", "false", "0", "off", "✗"]);

/**
 * What did somebody type? Reads a text as a value of its parameter's kind; nothing is rounded and the text is kept.
 * ND has no number (never 0 and never half a limit); TNTC is ">" without a number; a reported 0 is the number 0.
 * Refuses with a sentence that says what to write instead.
 * Source for keeping qualifier and number apart: EPA data qualifiers (U, J, R), reference notes on censored data.
 * @example parseValue("<0,05", { kind: "number" }) // => { ok: true, qualifier: "<", value: 0.05, text: "<0,05" }
 */
export function parseValue(
  typed: string,
  shape: ValueShape,
  separator: DecimalSeparator = "auto",
): ParsedValue {
  const text = typed.replace(/[\s\u00a0\u2007\u2009\u202f]+/g, " ").trim();
  if (text === "") return refuse("empty", "There is no value. Type one, or leave the place empty.");
  if (typed.length > LONGEST_TEXT) {
    return refuse("too-long", `The text has more than ${LONGEST_TEXT} characters. Shorten it.`);
  }
  if (hasControlCharacters(typed)) {
    return refuse("control-characters", "The text holds control characters. Type it again.");
  }
  switch (shape.kind) {
    case "text":
      return { ok: true, qualifier: "", value: null, text: typed.trim() };
    case "yes-no":
      return parseYesNo(text);
    case "choice":
      return parseChoice(text, shape.choices ?? []);
    case "number":
      return parseQuantity(text, separator);
    case "count":
      return wholeCount(parseQuantity(text, separator));
  }
}

function parseQuantity(text: string, separator: DecimalSeparator): ParsedValue {
  if (NOT_DETECTED.test(text)) return { ok: true, qualifier: "ND", value: null, text };
  if (BELOW_UNKNOWN.test(text)) return { ok: true, qualifier: "<", value: null, text };
  if (TOO_MANY.test(text)) return { ok: true, qualifier: ">", value: null, text };
  if (text.length > LONGEST_NUMBER) {
    return refuse(
      "not-a-number",
      "This is too long for a number. Write digits with a point or comma, such as 8.12.",
    );
  }
  if (/^([≤≥]|[<>]\s?=)/.test(text)) {
    return refuse(
      "not-a-number",
      `Write < or > alone in front of the number, such as <0.05, instead of “${text}”.`,
    );
  }
  const tidied = tidy(text);
  const qualifier = qualifierOf(tidied);
  const number = parseNumber(qualifier === "" ? tidied : tidied.slice(1), separator);
  if (!number.ok) {
    const sentence = number.code === "not-a-number" ? notANumber(text) : number.sentence;
    return { ok: false, code: number.code, sentence };
  }
  return { ok: true, qualifier, value: number.value, text };
}

function qualifierOf(text: string): Qualifier {
  if (text.startsWith("<")) return "<";
  return text.startsWith(">") ? ">" : "";
}

function wholeCount(parsed: ParsedValue): ParsedValue {
  if (!parsed.ok || parsed.value === null) return parsed;
  if (!Number.isSafeInteger(parsed.value)) {
    return refuse("not-whole", `“${parsed.text}” is not a whole number. A count has no decimals.`);
  }
  if (parsed.value < 0)
    return refuse("negative-count", `“${parsed.text}” is below nothing. A count starts at 0.`);
  return parsed;
}

function parseYesNo(text: string): ParsedValue {
  const answer = text.toLowerCase();
  if (YES.has(answer)) return { ok: true, qualifier: "", value: 1, text: "yes" };
  if (NO.has(answer)) return { ok: true, qualifier: "", value: 0, text: "no" };
  return refuse("not-an-answer", `“${text}” is neither yes nor no. Write yes or no.`);
}

function parseChoice(text: string, choices: NonNullable<ValueShape["choices"]>): ParsedValue {
  const wanted = text.toLowerCase();
  const found = choices.find(
    (each) => each.code.toLowerCase() === wanted || each.label.toLowerCase() === wanted,
  );
  if (found) return { ok: true, qualifier: "", value: null, text: found.code };
  const labels = choices.map((each) => each.label).join(", ");
  return refuse("not-an-answer", `“${text}” is not one of the answers. Choose one of: ${labels}.`);
}

function hasControlCharacters(text: string): boolean {
  return [...text].some((ch) => {
    const code = ch.codePointAt(0) ?? 0;
    return (code < 32 && ch !== "\n" && ch !== "\r" && ch !== "\t") || code === 127;
  });
}

function notANumber(text: string): string {
  const withUnit = /^[<>]?\s?[-+]?[0-9.,]+\s?[^0-9.,\s].*$/.exec(text);
  if (withUnit)
    return `“${text}” holds more than a number. Write the number alone; the unit stands beside it.`;
  return `“${text}” is not a number. Write digits with a point or comma, such as 8.12, <0.05 or ND.`;
}

function refuse(code: ParseProblemCode, sentence: string): ParsedValue {
  return { ok: false, code, sentence };
}
