import type { Measured, ShapeDimensions, VolumeComponent } from "@/modules/systems/model";

/** A quantity and its standard uncertainty; exact unless told. */
export const measured = (value: number, standardUncertainty = 0): Measured => ({
  value,
  standardUncertainty,
});

/** A component, full, with nothing in it and not at the surface, unless told otherwise. */
export function component(
  dimensions: ShapeDimensions,
  rest: Partial<Pick<VolumeComponent, "name" | "fillDepthM" | "displacementL" | "isAtSurface">> = {},
): VolumeComponent {
  return { name: "piece", fillDepthM: null, displacementL: null, isAtSurface: false, ...rest, ...dimensions };
}

/** The same component holding water to a depth in metres. */
export const filledTo = (whole: VolumeComponent, depthM: number): VolumeComponent => ({
  ...whole,
  fillDepthM: measured(depthM),
});
