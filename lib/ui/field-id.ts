/**
 * The id of the control of a named field; an error summary links to it.
 * @example fieldId("lines.0.mass_kg") === "field-lines-0-mass_kg"
 */
export function fieldId(name: string): string {
  return `field-${name.replace(/[^A-Za-z0-9_-]+/g, "-")}`;
}
