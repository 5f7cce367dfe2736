import { findUnit } from "@/lib/units/factors";
import type { ParameterDefinition } from "../model";

/** What is wrong with a definition, where (form path) and as a sentence. */
export interface DefinitionFault {
  readonly path: readonly (string | number)[];
  readonly sentence: string;
}

type Definition = Pick<
  ParameterDefinition,
  "kind" | "unit" | "acceptedUnits" | "decimals" | "plausible" | "choices" | "mayBeNegative"
>;

const fault = (sentence: string, ...path: (string | number)[]): DefinitionFault => ({ path, sentence });

/**
 * Does the definition of a parameter hold together? Units exist and are of one kind, with the canonical one among the
 * accepted; bounds in order; answers told apart, with two or more of them, and exactly yes and no where it is one.
 * Answers every fault at once; an empty list is a sound definition.
 */
export function definitionFaults(definition: Definition): DefinitionFault[] {
  const isMeasured = definition.kind === "number" || definition.kind === "count";
  return isMeasured ? measuredFaults(definition) : answeredFaults(definition);
}

function measuredFaults(definition: Definition): DefinitionFault[] {
  const { plausible, decimals, kind, mayBeNegative } = definition;
  const faults = unitFaults(definition);
  if (definition.choices.length > 0) faults.push(fault("A number has no answers to choose from.", "choices"));
  if (kind === "count" && decimals !== 0) faults.push(fault("A count has no decimals: write 0.", "decimals"));
  if (plausible.low !== null && plausible.high !== null && plausible.low >= plausible.high) {
    faults.push(fault("The highest plausible value must be above the lowest.", "plausible", "high"));
  }
  if (!mayBeNegative && plausible.low !== null && plausible.low < 0) {
    faults.push(
      fault(
        "Below 0 only where the parameter may be negative: tick that, or raise this.",
        "plausible",
        "low",
      ),
    );
  }
  return faults;
}

function unitFaults({ unit, acceptedUnits }: Definition): DefinitionFault[] {
  if (unit === null) {
    return acceptedUnits.length === 0 ? [] : [fault("A bare number has no other units.", "acceptedUnits")];
  }
  const canonical = findUnit(unit);
  if (!canonical) return [fault(`“${unit}” is not a unit that is known here.`, "unit")];
  const faults: DefinitionFault[] = [];
  if (canonical.needs) {
    faults.push(
      fault(`${unit} rests on a second measurement and cannot be the unit that is stored.`, "unit"),
    );
  }
  if (!acceptedUnits.includes(unit)) {
    faults.push(
      fault(`${unit}, the unit that is stored, is always accepted: leave it ticked.`, "acceptedUnits"),
    );
  }
  for (const code of acceptedUnits) {
    const found = findUnit(code);
    if (!found) faults.push(fault(`“${code}” is not a unit that is known here.`, "acceptedUnits"));
    else if (found.dimension !== canonical.dimension) {
      faults.push(
        fault(`${code} cannot be turned into ${unit}: they measure different things.`, "acceptedUnits"),
      );
    }
  }
  return faults;
}

function answeredFaults({ kind, unit, acceptedUnits, plausible, choices }: Definition): DefinitionFault[] {
  const faults: DefinitionFault[] = [];
  if (unit !== null || acceptedUnits.length > 0) faults.push(fault("An answer has no unit.", "unit"));
  if (plausible.low !== null || plausible.high !== null) {
    faults.push(fault("An answer has no plausible bounds: leave them empty.", "plausible", "low"));
  }
  if (kind === "text") {
    if (choices.length > 0) faults.push(fault("A text has no answers to choose from.", "choices"));
    return faults;
  }
  const codes = choices.map((choice) => choice.code);
  codes.forEach((code, index) => {
    if (codes.indexOf(code) !== index) {
      faults.push(fault(`The answer “${code}” stands in the list twice.`, "choices", index, "code"));
    }
  });
  if (kind === "yes-no" && [...codes].sort().join() !== "no,yes") {
    faults.push(fault("Give exactly the answers yes and no.", "choices"));
  }
  if (kind === "choice" && codes.length < 2) faults.push(fault("Give two answers or more.", "choices"));
  return faults;
}
