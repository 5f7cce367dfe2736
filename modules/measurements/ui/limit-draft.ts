import { localToEpoch } from "@/lib/zone";
import type { FacilityParameter } from "@/modules/methods/model";
import type { Bounds, LimitShape, LimitVersion } from "../model";
import { formatNumber } from "../rules/format-value";
import { checkLimitShape } from "../rules/order-of-limits";
import { parseNumber } from "../rules/parse-number";

export const BOUND_FIELDS = [
  "toleranceLow",
  "watchLow",
  "target",
  "watchHigh",
  "toleranceHigh",
  "greatestChange24h",
] as const satisfies readonly (keyof Bounds)[];
export type BoundField = (typeof BOUND_FIELDS)[number];

/** What a column of the sheet is called. */
export const FIELD_WORDS: Readonly<Record<BoundField, string>> = {
  toleranceLow: "Tolerance low",
  watchLow: "Watch low",
  target: "Target",
  watchHigh: "Watch high",
  toleranceHigh: "Tolerance high",
  greatestChange24h: "Change in 24 h",
};

export const DRAFT_KINDS = ["constant", "ramp", "season", "suspended"] as const;
export type DraftKind = (typeof DRAFT_KINDS)[number];

export interface DraftKnot {
  /** "YYYY-MM-DD" of a ramp, "MM-DD" of a season, nothing where limits are constant. */
  readonly when: string;
  readonly texts: Readonly<Record<BoundField, string>>;
  /** The moment that `was` stood for: kept while the day is not touched, whatever its time of day. */
  readonly was?: { readonly when: string; readonly at: number };
}

/** Limits as typed. Texts are kept as they are until they are sent. */
export interface LimitDraft {
  readonly kind: DraftKind;
  /** One where limits are constant; two or more of a ramp or a season. */
  readonly knots: readonly DraftKnot[];
  readonly suspendedReason: string;
}

/** What is wrong in a draft, and in which cell. `field` null: the row as a whole. */
export interface DraftProblem {
  readonly knot: number;
  readonly fields: readonly (BoundField | "when" | "reason")[];
  readonly sentence: string;
}

/** A draft as it is sent, or what is wrong with it. */
export type ReadDraft =
  | { readonly ok: true; readonly shape: LimitShape; readonly suspendedReason: string | null }
  | { readonly ok: false; readonly problems: readonly DraftProblem[] };

const NO_TEXTS: Readonly<Record<BoundField, string>> = {
  toleranceLow: "",
  watchLow: "",
  target: "",
  watchHigh: "",
  toleranceHigh: "",
  greatestChange24h: "",
};

export const emptyDraft = (): LimitDraft => ({
  kind: "constant",
  knots: [{ when: "", texts: NO_TEXTS }],
  suspendedReason: "",
});

const textsOf = (bounds: Bounds): Record<BoundField, string> => {
  const texts = { ...NO_TEXTS };
  for (const field of BOUND_FIELDS) {
    const value = bounds[field];
    if (value !== undefined) texts[field] = formatNumber(value, null);
  }
  return texts;
};

/** Limits as they stand, to be changed. `dayOf` says which day a moment has in the facility. */
export function draftOf(shape: LimitShape, dayOf: (at: number) => string, suspendedReason = ""): LimitDraft {
  const kind = suspendedReason === "" ? shape.kind : "suspended";
  if (shape.kind === "constant") {
    return { kind, knots: [{ when: "", texts: textsOf(shape.bounds) }], suspendedReason };
  }
  const knots =
    shape.kind === "ramp"
      ? shape.knots.map(({ at, bounds }) => ({
          when: dayOf(at),
          texts: textsOf(bounds),
          was: { when: dayOf(at), at },
        }))
      : shape.knots.map(({ monthDay, bounds }) => ({ when: monthDay, texts: textsOf(bounds) }));
  return { kind, knots, suspendedReason };
}

/** The draft of a version in force; an empty one where there is none. */
export function draftOfVersion(version: LimitVersion | null, dayOf: (at: number) => string): LimitDraft {
  return version ? draftOf(version.shape, dayOf, version.suspended?.reason ?? "") : emptyDraft();
}

/** Another kind of limits: what is typed is kept as far as it has a place. */
export function withKind(draft: LimitDraft, kind: DraftKind): LimitDraft {
  const [first = { when: "", texts: NO_TEXTS }, ...more] = draft.knots;
  if (kind === "suspended" || kind === draft.kind) return { ...draft, kind };
  if (kind === "constant") return { ...draft, kind, knots: [{ when: "", texts: first.texts }] };
  const second = more[0] ?? first;
  return {
    ...draft,
    kind,
    knots: [
      { when: "", texts: first.texts },
      { when: "", texts: second.texts },
    ],
  };
}

/**
 * What a draft means, or every problem in it with its cells: numbers with comma or point, empty means open, then the
 * order as the server checks it. Days of a ramp begin at 00:00 in `zone`.
 */
export function readDraft(
  draft: LimitDraft,
  parameter: Pick<FacilityParameter, "plausible" | "decimals">,
  zone: string,
): ReadDraft {
  if (draft.kind === "suspended") {
    const suspendedReason = draft.suspendedReason.trim();
    if (suspendedReason.length >= 3)
      return { ok: true, shape: { kind: "constant", bounds: {} }, suspendedReason };
    const sentence = "Say why there are no limits, such as: no animals.";
    return { ok: false, problems: [{ knot: 0, fields: ["reason"], sentence }] };
  }
  const problems: DraftProblem[] = [];
  const bounds = draft.knots.map((knot, index) => readBounds(knot, index, problems));
  const shape = shapeOf(draft, bounds, zone, problems);
  if (shape === null || problems.length > 0) return { ok: false, problems };
  for (const found of checkLimitShape(shape, parameter)) {
    const isDay = found.code === "knots-out-of-order" || found.code === "bad-month-day";
    problems.push({
      knot: found.knot ?? 0,
      fields: isDay ? ["when"] : found.fields,
      sentence: found.sentence,
    });
  }
  return problems.length > 0 ? { ok: false, problems } : { ok: true, shape, suspendedReason: null };
}

function readBounds(knot: DraftKnot, index: number, problems: DraftProblem[]): Bounds {
  const bounds: { -readonly [Name in keyof Bounds]: Bounds[Name] } = {};
  for (const field of BOUND_FIELDS) {
    const text = knot.texts[field].trim();
    if (text === "") continue;
    const read = parseNumber(text);
    if (read.ok) bounds[field] = read.value;
    else problems.push({ knot: index, fields: [field], sentence: numberSentence(text, field, read) });
  }
  return bounds;
}

function numberSentence(text: string, field: BoundField, read: { code: string; sentence: string }): string {
  if (read.code !== "not-a-number") return `${FIELD_WORDS[field]}: ${read.sentence}`;
  return `${FIELD_WORDS[field]}: “${text}” is not a number. Write digits with a point or comma, or leave it empty.`;
}

function shapeOf(
  draft: LimitDraft,
  bounds: readonly Bounds[],
  zone: string,
  problems: DraftProblem[],
): LimitShape | null {
  if (draft.kind === "constant") return { kind: "constant", bounds: bounds[0] ?? {} };
  if (draft.kind === "season") {
    draft.knots.forEach(({ when }, knot) => {
      if (when.trim() !== "") return;
      problems.push({
        knot,
        fields: ["when"],
        sentence: `Give day ${knot + 1} as month and day, such as 03-21.`,
      });
    });
    return {
      kind: "season",
      knots: draft.knots.map(({ when }, index) => ({ monthDay: when.trim(), bounds: bounds[index] ?? {} })),
    };
  }
  const knots = draft.knots.map((knot, index) => {
    const at = startOfDay(knot, zone);
    if (at === null)
      problems.push({ knot: index, fields: ["when"], sentence: `Give day ${index + 1} of the ramp.` });
    return { at: at ?? 0, bounds: bounds[index] ?? {} };
  });
  return { kind: "ramp", knots };
}

function startOfDay({ when, was }: DraftKnot, zone: string): number | null {
  if (was && was.when === when) return was.at;
  return momentOf(`${when}T00:00`, zone);
}

/**
 * The moment of "YYYY-MM-DDTHH:MM" on the facility's clock; null where it is none. Of an hour shown twice the earlier
 * one, of an hour never shown the moment at which the clock jumped past it.
 */
export function momentOf(text: string, zone: string): number | null {
  const [on = "", at = ""] = text.split("T");
  try {
    const read = localToEpoch({ on, at, zone, disambiguation: "earlier" });
    return read.kind === "one" ? read.epochMs : read.later.epochMs;
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
