import { convertByFactor } from "@/lib/units/factors";
import type {
  LengthUnit,
  Measured,
  TypedComponent,
  TypedQuantity,
  VolumeComponent,
  VolumeUnit,
} from "../model";
import { SHAPE_TABLE } from "../shapes.data";
import { ComponentRangeError, componentVolume } from "./component-volume";

const NUMBER = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)$/;

/**
 * What number was typed? Comma or point for the decimals; blanks between figures are left out; null where it is no number.
 *
 * @example readDecimal("2,5") // => 2.5
 * @example readDecimal("12 000") // => 12000
 * @example readDecimal("1e3") // => null
 */
export function readDecimal(text: string): number | null {
  const plain = text
    .replace(/(?<=\d)[\s\u00a0\u202f]+(?=\d)/g, "")
    .replace("\u2212", "-")
    .trim();
  return NUMBER.test(plain) ? Number(plain.replace(",", ".")) : null;
}

/** A typed quantity in its canonical unit; ComponentRangeError names the field where it is no number. */
export function readQuantity(
  typed: TypedQuantity,
  from: LengthUnit | VolumeUnit,
  to: "m" | "L",
  field: string,
): Measured {
  const value = readDecimal(typed.text);
  if (value === null) throw new ComponentRangeError(field, "Type a number, such as 2.4.");
  const isExact = typed.uncertainty.trim() === "";
  const uncertainty = isExact ? 0 : readDecimal(typed.uncertainty);
  if (uncertainty === null || uncertainty < 0) {
    throw new ComponentRangeError(
      field,
      "The standard uncertainty must be a number of 0 or more, such as 0.005.",
    );
  }
  return {
    value: convertByFactor(value, from, to),
    standardUncertainty: convertByFactor(uncertainty, from, to),
  };
}

/**
 * A component as typed, brought to metres and litres. Throws ComponentRangeError naming the input that is missing or
 * cannot be read; whether the figures make a tank is for componentVolume to say.
 */
export function readComponent(typed: TypedComponent): VolumeComponent {
  const { inputs, pointing } = SHAPE_TABLE[typed.shape];
  const dimensions = inputs.map(({ name, label, kind }) => {
    const quantity = typed.dimensions[name];
    if (!quantity) throw new ComponentRangeError(name, `${label} is missing.`);
    return [
      name,
      kind === "length"
        ? readQuantity(quantity, typed.lengthUnit, "m", name)
        : readQuantity(quantity, typed.volumeUnit, "L", name),
    ] as const;
  });
  const stand = typed.shape === "cone" ? "tip" : "crown";
  // The table of inputs and the union of shapes say the same; typed-component.test.ts holds them together.
  return {
    name: typed.name,
    shape: typed.shape,
    ...(pointing ? { [stand]: typed.pointing } : {}),
    ...Object.fromEntries(dimensions),
    fillDepthM: typed.fillDepth && readQuantity(typed.fillDepth, typed.lengthUnit, "m", "fillDepthM"),
    displacementL:
      typed.displacement && readQuantity(typed.displacement, typed.volumeUnit, "L", "displacementL"),
    isAtSurface: typed.isAtSurface,
  } as VolumeComponent;
}

/** One thing that stands in the way of a component's volume: the path of its field within the component, a sentence. */
export type ComponentProblem = { path: string[]; message: string };

/**
 * Everything that stands in the way of a component's volume: first every figure that is missing or cannot be read, all at
 * once; where each can be read, what keeps them from making a tank. Empty when the volume can be computed.
 */
export function componentProblems(typed: TypedComponent): ComponentProblem[] {
  const { inputs } = SHAPE_TABLE[typed.shape];
  const checks: (() => unknown)[] = inputs.map(({ name, label, kind }) => () => {
    const quantity = typed.dimensions[name];
    if (!quantity || quantity.text.trim() === "") throw new ComponentRangeError(name, `${label} is missing.`);
    return kind === "length"
      ? readQuantity(quantity, typed.lengthUnit, "m", name)
      : readQuantity(quantity, typed.volumeUnit, "L", name);
  });
  const { fillDepth, displacement } = typed;
  if (fillDepth) checks.push(() => readQuantity(fillDepth, typed.lengthUnit, "m", "fillDepthM"));
  if (displacement) checks.push(() => readQuantity(displacement, typed.volumeUnit, "L", "displacementL"));
  const unread = checks.flatMap(problemOf);
  return unread.length > 0 ? unread : problemOf(() => componentVolume(readComponent(typed)));
}

function problemOf(check: () => unknown): ComponentProblem[] {
  try {
    check();
    return [];
  } catch (error) {
    if (!(error instanceof ComponentRangeError)) throw error;
    return [{ path: typedPath(error.field), message: error.message }];
  }
}

/** Where in a typed component the field of a ComponentRangeError stands, as a path. */
function typedPath(field: string): string[] {
  if (field === "fillDepthM") return ["fillDepth"];
  if (field === "displacementL") return ["displacement"];
  return ["dimensions", field];
}
