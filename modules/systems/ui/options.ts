import type { SelectOption } from "@/lib/ui";

/** Codes with their words as the options of a list, the first letter large. */
export function wordOptions<Code extends string>(
  codes: readonly Code[],
  words: Readonly<Record<Code, string>>,
): SelectOption[] {
  return codes.map((code) => ({ value: code, label: capital(words[code]) }));
}

/** @example capital("mixing tank") // "Mixing tank" */
export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
