import type { Dimension } from "@/lib/units/factors";

/** The dimensions in which people's habits differ, in the words of the trade, with an example of a value in each. */
export const UNIT_DIMENSIONS: readonly { dimension: Dimension; label: string }[] = [
  { dimension: "temperature", label: "Temperature" },
  { dimension: "salinity", label: "Salinity" },
  { dimension: "conductivity", label: "Conductivity" },
  { dimension: "alkalinity", label: "Alkalinity" },
  { dimension: "oxygen", label: "Dissolved oxygen" },
  { dimension: "ammonia", label: "Ammonia" },
  { dimension: "nitrite", label: "Nitrite" },
  { dimension: "nitrate", label: "Nitrate" },
  { dimension: "phosphate", label: "Phosphate" },
  { dimension: "calcium", label: "Calcium" },
  { dimension: "magnesium", label: "Magnesium" },
  { dimension: "volume", label: "Volume" },
  { dimension: "flow", label: "Flow" },
  { dimension: "pressure", label: "Pressure" },
  { dimension: "length", label: "Length" },
  { dimension: "mass", label: "Mass" },
];
