import type { ComponentVolume, Measured, Shape, TypedComponent, TypedQuantity, VolumeUnit } from "../model";
import { componentVolume } from "../rules/component-volume";
import { totalVolume } from "../rules/total-volume";
import { componentProblems, readComponent } from "../rules/typed-component";
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

export type ComponentReading = {
  /** What it holds; null while something stands in the way. */
  volume: ComponentVolume | null;
  /** Sentences by path within the component; those of fields that are still empty are no mistakes yet. */
  problems: { path: string; message: string; isUntouched: boolean }[];
};

/** What a component holds, or every field that stands in the way. */
export function readingOf(component: TypedComponent): ComponentReading {
  const problems = componentProblems(component).map(({ path, message }) => {
    const typed = typedAt(component, path);
    return { path: path.join("."), message, isUntouched: typed === undefined || typed.text.trim() === "" };
  });
  return { volume: problems.length > 0 ? null : componentVolume(readComponent(component)), problems };
}

function typedAt(component: TypedComponent, path: readonly string[]): TypedQuantity | undefined {
  const [head = "", input = ""] = path;
  if (head === "fillDepth") return component.fillDepth ?? undefined;
  if (head === "displacement") return component.displacement ?? undefined;
  return component.dimensions[input];
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
