import type { ParameterDefinition } from "../model";

/** The entries of a catalogue whose code and name no parameter has yet, retired ones included. */
export function missingFromCatalogue(
  catalogue: readonly ParameterDefinition[],
  known: readonly { readonly code: string; readonly name: string }[],
): ParameterDefinition[] {
  const codes = new Set(known.map((each) => each.code.toLowerCase()));
  const names = new Set(known.map((each) => each.name.toLowerCase()));
  return catalogue.filter(
    ({ code, name }) => !codes.has(code.toLowerCase()) && !names.has(name.toLowerCase()),
  );
}
