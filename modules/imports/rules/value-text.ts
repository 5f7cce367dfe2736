import type { ParsedValue } from "@/modules/imports/model";

/**
 * A value of a file as text that means the same in every file: decimal point, no groups, the relation in front.
 * What a file calls "8,12" and a workbook holds as the number 8.12 is "8.12". The text as typed is kept beside it.
 * @example plainValueText({ kind: "number", number: 0.05, relation: "<", qualifier: null }) // => "<0.05"
 */
export function plainValueText(value: ParsedValue): string {
  if (value.kind === "text") return value.text;
  if (value.kind === "unquantified") return value.relation === "<" ? "ND" : "TNTC";
  return `${value.relation ?? ""}${value.number}`;
}
