import type { SelectGroup, SelectOption } from "@/lib/ui";
import { acceptedUnits, type Dimension, unitLabel } from "@/lib/units/factors";
import { UNIT_TABLE } from "@/lib/units/unit-table.data";
import type { FacilityParameter } from "../model";
import { PARAMETER_GROUP_WORDS, PARAMETER_GROUPS } from "../model";

/** A word with a capital first letter. */
export const capital = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1);

/** Units in which a value can be stored, under what they measure. */
export function storedUnitOptions(): SelectGroup[] {
  const dimensions = [...new Set(UNIT_TABLE.map((unit) => unit.dimension))];
  return dimensions.flatMap((dimension: Dimension) => {
    const options = acceptedUnits(dimension)
      .filter((unit) => !unit.needs)
      .map((unit) => ({ value: unit.code, label: unitLabel(unit.code) || unit.code }));
    return options.length === 0 ? [] : [{ label: capital(dimension.replaceAll("-", " ")), options }];
  });
}

/** Parameters under their groups. */
export function parameterOptions(parameters: readonly FacilityParameter[]): SelectGroup[] {
  return PARAMETER_GROUPS.flatMap((group) => {
    const options: SelectOption[] = parameters
      .filter((each) => each.group === group)
      .map((each) => ({ value: String(each.id), label: each.name }));
    return options.length === 0 ? [] : [{ label: PARAMETER_GROUP_WORDS[group], options }];
  });
}
