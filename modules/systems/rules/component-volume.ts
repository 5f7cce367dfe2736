import type { ComponentVolume, Measured, ShapeDimensions, VolumeComponent } from "../model";
import {
  box,
  cone,
  frustum,
  lyingCylinder,
  lyingElliptic,
  type Solid,
  sphericalCap,
  uprightCylinder,
  uprightElliptic,
} from "./solid";
import { combineUncorrelated, contributionOf } from "./uncertainty";

/** Litres in a cubic metre (BIPM, SI Brochure, 9th ed., table 8: 1 L = 10⁻³ m³). */
export const LITRES_PER_CUBIC_METRE = 1000;

/** A dimension that is out of domain; `field` names the input. */
export class ComponentRangeError extends RangeError {
  constructor(
    readonly field: string,
    message: string,
  ) {
    super(message);
    this.name = "ComponentRangeError";
  }
}

/**
 * How many litres of water does one piece of a system hold, and how surely?
 * Inner dimensions only; not for tanks with ends or walls of another form: compose those from several pieces.
 *
 * Formula: that of its shape (see solid.ts) at the fill depth, × 1000, less the displacement. Uncertainty by first-order
 * propagation (JCGM 100:2008, 5.1.2) with exact (analytic) partial derivatives; inputs are taken as not correlated.
 * Units: metres and litres. Domain: finite dimensions above 0 (one end of a frustum may be 0), uncertainties ≥ 0, depth
 * from 0 to the height, displacement no greater than what is under water; ComponentRangeError (a RangeError) outside it.
 * Source: solids, Bronshtein & Semendyayev, Handbook of Mathematics (geometry); uncertainty, GUM.
 * Checked: tests/published/volume-*.test.ts.
 *
 * @example componentVolume({ name: "tank", shape: "box", lengthM: { value: 2, standardUncertainty: 0 }, widthM: { value: 1, standardUncertainty: 0 }, heightM: { value: 1, standardUncertainty: 0 }, fillDepthM: { value: 0.5, standardUncertainty: 0 }, displacementL: null, isAtSurface: true }).volumeL // => 1000
 */
export function componentVolume(component: VolumeComponent): ComponentVolume {
  const inputs = inputsOf(component);
  checkInputs(component, inputs);
  const solid = component.shape === "free-litres" ? freeLitres(component.volumeL.value) : solidOf(component);
  const grossL = solid.volumeM3 * LITRES_PER_CUBIC_METRE;
  const displacementL = component.displacementL?.value ?? 0;
  if (displacementL > grossL) {
    throw new ComponentRangeError(
      "displacementL",
      "What stands in the water takes up more than the water's own space.",
    );
  }
  const contributions = Object.entries(inputs).map(([input, measured]) => ({
    input,
    sensitivity: sensitivityOf(input, solid),
    standardUncertainty: measured.standardUncertainty,
  }));
  return {
    name: component.name,
    grossL,
    displacementL,
    volumeL: grossL - displacementL,
    standardUncertaintyL: combineUncorrelated(contributions),
    surfaceAreaM2: solid.surfaceAreaM2,
    shares: contributions.map((each) => ({ input: each.input, contributionL: contributionOf(each) })),
  };
}

/** Litres per metre of each dimension; litres per litre of what is given in litres. */
function sensitivityOf(input: string, solid: Solid): number {
  if (input === "displacementL") return -1;
  return (solid.sensitivities[input] ?? 0) * LITRES_PER_CUBIC_METRE;
}

function freeLitres(volumeL: number): Solid {
  const perLitre = 1 / LITRES_PER_CUBIC_METRE;
  return { volumeM3: volumeL * perLitre, sensitivities: { volumeL: perLitre }, surfaceAreaM2: 0 };
}

function solidOf(component: Exclude<ShapeDimensions, { shape: "free-litres" }> & VolumeComponent): Solid {
  const fillM = component.fillDepthM?.value ?? null;
  switch (component.shape) {
    case "box":
      return box(component.lengthM.value, component.widthM.value, component.heightM.value, fillM);
    case "upright-cylinder":
      return uprightCylinder(component.diameterM.value, component.heightM.value, fillM);
    case "lying-cylinder":
      return lyingCylinder(component.diameterM.value, component.lengthM.value, fillM, "diameterM");
    case "cone":
      return cone(component.tip, component.diameterM.value, component.heightM.value, fillM);
    case "frustum":
      return frustum(
        component.bottomDiameterM.value,
        component.topDiameterM.value,
        component.heightM.value,
        fillM,
      );
    case "spherical-cap":
      return sphericalCap(component.crown, component.rimDiameterM.value, component.heightM.value, fillM);
    case "upright-elliptic":
      return uprightElliptic(
        component.longDiameterM.value,
        component.shortDiameterM.value,
        component.heightM.value,
        fillM,
      );
    case "lying-elliptic":
      return lyingElliptic(component.widthM.value, component.heightM.value, component.lengthM.value, fillM);
    case "pipe-run":
      return lyingCylinder(component.innerDiameterM.value, component.lengthM.value, fillM, "innerDiameterM");
  }
}

/** Every quantity with an uncertainty, by its field's name. */
function inputsOf(component: VolumeComponent): Record<string, Measured> {
  const isMeasured = (value: unknown): value is Measured =>
    typeof value === "object" && value !== null && "standardUncertainty" in value;
  return Object.fromEntries(
    Object.entries(component).filter((entry): entry is [string, Measured] => isMeasured(entry[1])),
  );
}

/** The inner height that a depth of water is compared with; undefined for free litres. */
export function innerHeightM(dimensions: ShapeDimensions): number | undefined {
  switch (dimensions.shape) {
    case "free-litres":
      return undefined;
    case "lying-cylinder":
      return dimensions.diameterM.value;
    case "pipe-run":
      return dimensions.innerDiameterM.value;
    default:
      return dimensions.heightM.value;
  }
}

function checkInputs(component: VolumeComponent, inputs: Record<string, Measured>): void {
  const mayBeZero = new Set(["fillDepthM", "displacementL", "volumeL"]);
  if (component.shape === "frustum" && component.bottomDiameterM.value + component.topDiameterM.value > 0) {
    mayBeZero.add("bottomDiameterM").add("topDiameterM");
  }
  for (const [field, { value, standardUncertainty }] of Object.entries(inputs)) {
    const isInDomain = Number.isFinite(value) && (mayBeZero.has(field) ? value >= 0 : value > 0);
    if (!isInDomain) {
      throw new ComponentRangeError(
        field,
        `This must be a number ${mayBeZero.has(field) ? "of 0 or more" : "above 0"}.`,
      );
    }
    if (!(Number.isFinite(standardUncertainty) && standardUncertainty >= 0)) {
      throw new ComponentRangeError(field, "The standard uncertainty must be a number of 0 or more.");
    }
  }
  const heightM = innerHeightM(component);
  if (heightM === undefined && component.fillDepthM !== null) {
    throw new ComponentRangeError("fillDepthM", "Litres given as they are have no depth of water.");
  }
  if (heightM !== undefined && component.fillDepthM !== null && component.fillDepthM.value > heightM) {
    throw new ComponentRangeError(
      "fillDepthM",
      "The water stands higher than the tank: lower the depth or mend the height.",
    );
  }
}
