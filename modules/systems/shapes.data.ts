import type { Shape } from "./model";

/** What a person is asked for each shape, in the order in which it is asked. All inner dimensions. */
export type ShapeInput = { name: string; label: string; kind: "length" | "volume" };

type ShapeEntry = {
  label: string;
  says: string;
  inputs: readonly ShapeInput[];
  /** Words for up and down where the shape may stand either way. */
  pointing: { question: string; down: string; up: string } | null;
  /** False where a depth of water has no meaning. */
  hasLevel: boolean;
};

const length = (name: string, label: string): ShapeInput => ({ name, label, kind: "length" });

export const SHAPE_TABLE: Readonly<Record<Shape, ShapeEntry>> = {
  box: {
    label: "Box",
    says: "Plumb walls, flat floor.",
    inputs: [
      length("lengthM", "Inner length"),
      length("widthM", "Inner width"),
      length("heightM", "Inner height"),
    ],
    pointing: null,
    hasLevel: true,
  },
  "upright-cylinder": {
    label: "Upright cylinder",
    says: "Round, standing.",
    inputs: [length("diameterM", "Inner diameter"), length("heightM", "Inner height")],
    pointing: null,
    hasLevel: true,
  },
  "lying-cylinder": {
    label: "Lying cylinder",
    says: "Round, on its side, flat ends. Add dished ends as components of their own.",
    inputs: [length("diameterM", "Inner diameter"), length("lengthM", "Inner length")],
    pointing: null,
    hasLevel: true,
  },
  cone: {
    label: "Cone",
    says: "A pointed bottom or top.",
    inputs: [length("diameterM", "Inner diameter of the wide end"), length("heightM", "Inner height")],
    pointing: { question: "Where is the tip?", down: "Tip below", up: "Tip above" },
    hasLevel: true,
  },
  frustum: {
    label: "Frustum",
    says: "A cone cut off: round, with a different diameter above and below.",
    inputs: [
      length("bottomDiameterM", "Inner diameter below"),
      length("topDiameterM", "Inner diameter above"),
      length("heightM", "Inner height"),
    ],
    pointing: null,
    hasLevel: true,
  },
  "spherical-cap": {
    label: "Spherical cap",
    says: "A dished bottom or a dome, part of a sphere.",
    inputs: [
      length("rimDiameterM", "Inner diameter of the rim"),
      length("heightM", "Height from rim to crown"),
    ],
    pointing: { question: "Where is the crown?", down: "Crown below (a dish)", up: "Crown above (a dome)" },
    hasLevel: true,
  },
  "upright-elliptic": {
    label: "Upright elliptic tank",
    says: "Oval in plan, plumb walls.",
    inputs: [
      length("longDiameterM", "Longer inner diameter"),
      length("shortDiameterM", "Shorter inner diameter"),
      length("heightM", "Inner height"),
    ],
    pointing: null,
    hasLevel: true,
  },
  "lying-elliptic": {
    label: "Lying elliptic tank",
    says: "Oval in section, on its side, flat ends.",
    inputs: [
      length("widthM", "Inner width of the oval"),
      length("heightM", "Inner height of the oval"),
      length("lengthM", "Inner length"),
    ],
    pointing: null,
    hasLevel: true,
  },
  "pipe-run": {
    label: "Pipe run",
    says: "Pipework of one bore.",
    inputs: [length("innerDiameterM", "Inner diameter"), length("lengthM", "Total length")],
    pointing: null,
    hasLevel: true,
  },
  "free-litres": {
    label: "Known volume",
    says: "A volume known from a maker's sheet or a measured fill.",
    inputs: [{ name: "volumeL", label: "Volume", kind: "volume" }],
    pointing: null,
    hasLevel: false,
  },
};
