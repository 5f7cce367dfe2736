import type { ComponentVolume, Measured, Shape, TypedComponent, TypedQuantity, VolumeUnit } from "../model";
import { ComponentRangeError, componentVolume } from "../rules/component-volume";
import { totalVolume } from "../rules/total-volume";
import { readComponent, typedPath } from "../rules/typed-component";
import { SHAPE_TABLE } from "../shapes.data";
import type { ReadingUnits } from "./volume-units";

export const NOTHING_TYPED: TypedQuantity = { text: "", uncertainty: "" };

/** A component as a person begins it. */
export function newComponent(units: ReadingUnits, isFirst: boolean): TypedComponent {
  return {
    name: isFirst ? "Main tank" : "",
    shape: "box",
    pointing: "down",
    lengthUnit: units.length,
    volumeUnit: units.volume,
    dimensions: {},
    fillDepth: isFirst ? NOTHING_TYPED : null,
    displacement: null,
    isAtSurface: isFirst,
  };
}

/** Another shape: the dimensions that both have stay as typed, the others go; what has no level loses its depth. */
export function withShape(component: TypedComponent, shape: Shape): TypedComponent {
  const { inputs, hasLevel } = SHAPE_TABLE[shape];
  const kept = inputs.flatMap(({ name }) => {
    const typed = component.dimensions[name];
    return typed ? [[name, typed] as const] : [];
  });
  return {
    ...component,
    shape,
    dimensions: Object.fromEntries(kept),
    fillDepth: hasLevel ? component.fillDepth : null,
    isAtSurface: hasLevel && component.isAtSurface,
  };
}

export type ComponentReading =
  | { volume: ComponentVolume; problem: null }
  | { volume: null; problem: { path: string; message: string; isUntouched: boolean } };

/** What a component holds, or which of its fields stands in the way. A field that is still empty is no mistake yet. */
export function readingOf(component: TypedComponent): ComponentReading {
  try {
    return { volume: componentVolume(readComponent(component)), problem: null };
  } catch (error) {
    if (!(error instanceof ComponentRangeError)) throw error;
    const typed = typedAt(component, error.field);
    const isUntouched = typed === undefined || typed.text.trim() === "";
    return {
      volume: null,
      problem: { path: typedPath(error.field).join("."), message: error.message, isUntouched },
    };
  }
}

function typedAt(component: TypedComponent, field: string): TypedQuantity | undefined {
  if (field === "fillDepthM") return component.fillDepth ?? undefined;
  if (field === "displacementL") return component.displacement ?? undefined;
  return component.dimensions[field];
}

/** The sum of what can be read so far, and how many components still cannot. */
export function runningTotal(
  components: readonly TypedComponent[],
  correlation: number,
): { total: Measured | null; surfaceAreaM2: number; unread: number } {
  const readable = components.filter((component) => readingOf(component).volume !== null);
  const unread = components.length - readable.length;
  if (readable.length === 0) return { total: null, surfaceAreaM2: 0, unread };
  const { volumeL, standardUncertaintyL, surfaceAreaM2 } = totalVolume(
    readable.map(readComponent),
    correlation,
  );
  return { total: { value: volumeL, standardUncertainty: standardUncertaintyL }, surfaceAreaM2, unread };
}

/** A component's own litres as a quantity. */
export const litresOf = (volume: ComponentVolume): Measured => ({
  value: volume.volumeL,
  standardUncertainty: volume.standardUncertaintyL,
});

/** The unit in which one of a shape's inputs is typed. */
export function unitOf(component: TypedComponent, kind: "length" | "volume"): string | VolumeUnit {
  return kind === "length" ? component.lengthUnit : component.volumeUnit;
}
