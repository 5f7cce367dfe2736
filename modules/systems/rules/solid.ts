import { circularSegment } from "./circular-segment";

/**
 * A solid's volume in cubic metres with its exact partial derivative for every input (cubic metres per metre), and the
 * area of the water's surface. Inputs that do not matter (the height of a part-full box) have no entry.
 */
export type Solid = { volumeM3: number; sensitivities: Record<string, number>; surfaceAreaM2: number };

const QUARTER_PI = Math.PI / 4;

/** The depth's name in `sensitivities`: the fill depth when part-full, the shape's own height when full. */
const depthName = (fillM: number | null, fullName: string): string =>
  fillM === null ? fullName : "fillDepthM";

/** An upright tank with the same level section all the way up: V = A · h. */
function prism(
  areaM2: number,
  perInput: Record<string, number>,
  heightM: number,
  fillM: number | null,
): Solid {
  const depthM = fillM ?? heightM;
  const scaled = Object.entries(perInput).map(([name, slope]) => [name, slope * depthM] as const);
  return {
    volumeM3: areaM2 * depthM,
    sensitivities: { ...Object.fromEntries(scaled), [depthName(fillM, "heightM")]: areaM2 },
    surfaceAreaM2: areaM2,
  };
}

/** V = l · w · h. */
export function box(lengthM: number, widthM: number, heightM: number, fillM: number | null): Solid {
  return prism(lengthM * widthM, { lengthM: widthM, widthM: lengthM }, heightM, fillM);
}

/** V = π/4 · d² · h. */
export function uprightCylinder(diameterM: number, heightM: number, fillM: number | null): Solid {
  return prism(QUARTER_PI * diameterM ** 2, { diameterM: 2 * QUARTER_PI * diameterM }, heightM, fillM);
}

/** V = π/4 · a · b · h with a, b the ellipse's two diameters. */
export function uprightElliptic(longM: number, shortM: number, heightM: number, fillM: number | null): Solid {
  const perInput = { longDiameterM: QUARTER_PI * shortM, shortDiameterM: QUARTER_PI * longM };
  return prism(QUARTER_PI * longM * shortM, perInput, heightM, fillM);
}

/** V = segment(d, h) · l; flat ends. `diameterName` says what the shape calls its diameter. */
export function lyingCylinder(
  diameterM: number,
  lengthM: number,
  fillM: number | null,
  diameterName: string,
): Solid {
  if (fillM === null) {
    const areaM2 = QUARTER_PI * diameterM ** 2;
    return {
      volumeM3: areaM2 * lengthM,
      sensitivities: { [diameterName]: 2 * QUARTER_PI * diameterM * lengthM, lengthM: areaM2 },
      surfaceAreaM2: 0,
    };
  }
  const segment = circularSegment(diameterM, fillM);
  return {
    volumeM3: segment.areaM2 * lengthM,
    sensitivities: {
      [diameterName]: segment.perDiameterM * lengthM,
      lengthM: segment.areaM2,
      fillDepthM: segment.perDepthM * lengthM,
    },
    surfaceAreaM2: segment.perDepthM * lengthM,
  };
}

/** A lying cylinder stretched sideways by width/height: V = (w/H) · segment(H, h) · l; flat ends. */
export function lyingElliptic(widthM: number, heightM: number, lengthM: number, fillM: number | null): Solid {
  const round = lyingCylinder(heightM, lengthM, fillM, "heightM");
  const stretch = widthM / heightM;
  const volumeM3 = round.volumeM3 * stretch;
  const perHeight = (round.sensitivities.heightM ?? 0) * stretch - volumeM3 / heightM;
  const sensitivities: Record<string, number> = {
    widthM: volumeM3 / widthM,
    heightM: perHeight,
    lengthM: volumeM3 / lengthM,
  };
  if (fillM !== null) sensitivities.fillDepthM = (round.sensitivities.fillDepthM ?? 0) * stretch;
  return { volumeM3, sensitivities, surfaceAreaM2: round.surfaceAreaM2 * stretch };
}

/** V = πh/12 · (b² + b·δ + δ²) with δ = b + (t − b)·h/H, the diameter at the water's surface. */
export function frustum(bottomM: number, topM: number, heightM: number, fillM: number | null): Solid {
  const depthM = fillM ?? heightM;
  const share = depthM / heightM;
  const surfaceM = bottomM + (topM - bottomM) * share;
  const twelfth = (Math.PI * depthM) / 12;
  const perSurface = twelfth * (bottomM + 2 * surfaceM);
  const surfaceAreaM2 = QUARTER_PI * surfaceM ** 2;
  const volumeM3 = twelfth * (bottomM ** 2 + bottomM * surfaceM + surfaceM ** 2);
  const perHeight =
    fillM === null
      ? { heightM: volumeM3 / heightM }
      : { heightM: (-perSurface * (topM - bottomM) * share) / heightM };
  return {
    volumeM3,
    sensitivities: {
      bottomDiameterM: twelfth * (2 * bottomM + surfaceM) + perSurface * (1 - share),
      topDiameterM: perSurface * share,
      ...perHeight,
      ...(fillM === null ? {} : { fillDepthM: surfaceAreaM2 }),
    },
    surfaceAreaM2,
  };
}

/** A cone is a frustum that ends in a point: full, V = π/12 · d² · H. */
export function cone(tip: "down" | "up", diameterM: number, heightM: number, fillM: number | null): Solid {
  const solid =
    tip === "down" ? frustum(0, diameterM, heightM, fillM) : frustum(diameterM, 0, heightM, fillM);
  const { bottomDiameterM = 0, topDiameterM = 0, ...rest } = solid.sensitivities;
  return { ...solid, sensitivities: { ...rest, diameterM: tip === "down" ? topDiameterM : bottomDiameterM } };
}

/**
 * A spherical cap with rim diameter c and height H lies on a sphere of radius R = (c²/4 + H²)/(2H).
 * Crown down (a dish), water depth h: V = πh²(3R − h)/3. Crown up (a dome): the whole less the empty cap of height H − h.
 */
export function sphericalCap(
  crown: "down" | "up",
  rimM: number,
  heightM: number,
  fillM: number | null,
): Solid {
  const halfRimM = rimM / 2;
  const whole = (Math.PI * heightM * (3 * halfRimM ** 2 + heightM ** 2)) / 6;
  const wholePerRim = (Math.PI * heightM * halfRimM) / 2;
  const wholePerHeight = (Math.PI * (halfRimM ** 2 + heightM ** 2)) / 2;
  if (fillM === null) {
    const surfaceAreaM2 = crown === "down" ? Math.PI * halfRimM ** 2 : 0;
    return {
      volumeM3: whole,
      sensitivities: { rimDiameterM: wholePerRim, heightM: wholePerHeight },
      surfaceAreaM2,
    };
  }
  const radiusM = (halfRimM ** 2 + heightM ** 2) / (2 * heightM);
  const radiusPerRim = halfRimM / (2 * heightM);
  const radiusPerHeight = 0.5 - halfRimM ** 2 / (2 * heightM ** 2);
  const capM = crown === "down" ? fillM : heightM - fillM;
  const capM3 = (Math.PI * capM ** 2 * (3 * radiusM - capM)) / 3;
  const perRadius = Math.PI * capM ** 2;
  const surfaceAreaM2 = Math.max(0, Math.PI * capM * (2 * radiusM - capM));
  if (crown === "down") {
    const slopes = { rimDiameterM: perRadius * radiusPerRim, heightM: perRadius * radiusPerHeight };
    return { volumeM3: capM3, sensitivities: { ...slopes, fillDepthM: surfaceAreaM2 }, surfaceAreaM2 };
  }
  return {
    // An empty dome is exactly empty: the two formulas differ in the last bit.
    volumeM3: Math.max(0, whole - capM3),
    sensitivities: {
      rimDiameterM: wholePerRim - perRadius * radiusPerRim,
      heightM: wholePerHeight - surfaceAreaM2 - perRadius * radiusPerHeight,
      fillDepthM: surfaceAreaM2,
    },
    surfaceAreaM2,
  };
}
