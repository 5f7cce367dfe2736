import type { AnswerMeaning, CheckVerdict, InstrumentState, ParameterGroup, ParameterKind } from "./model";

/** Codes as words on screen. */
export const PARAMETER_KIND_WORDS: Readonly<Record<ParameterKind, string>> = {
  number: "number",
  count: "count",
  "yes-no": "yes or no",
  choice: "one of several answers",
  text: "text",
};

export const PARAMETER_GROUP_WORDS: Readonly<Record<ParameterGroup, string>> = {
  physics: "Physics",
  gases: "Gases",
  "ph-and-alkalinity": "pH and alkalinity",
  nutrients: "Nutrients",
  "ions-and-metals": "Ions and metals",
  disinfection: "Disinfection",
  microbiology: "Microbiology",
  "source-water": "Source water",
  equipment: "Equipment",
  observation: "Observation",
};

export const ANSWER_MEANING_WORDS: Readonly<Record<AnswerMeaning, string>> = {
  within: "within",
  watch: "watch",
  out: "out of tolerance",
  none: "not judged",
};

export const INSTRUMENT_STATE_WORDS: Readonly<Record<InstrumentState, string>> = {
  "in-use": "in use",
  "out-of-use": "out of use",
  retired: "retired",
};

export const CHECK_VERDICT_WORDS: Readonly<Record<CheckVerdict, string>> = {
  good: "good",
  adjusted: "adjusted, then good",
  failed: "failed",
};
