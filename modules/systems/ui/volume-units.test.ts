import { describe, expect, it } from "vitest";
import { readingUnits, shownVolumeUnit } from "./volume-units";

describe("the unit of a volume on screen", () => {
  it("is the one that the person chose, whatever the size", () => {
    expect(shownVolumeUnit({ volume: "L" }, 310_700)).toBe("L");
    expect(shownVolumeUnit({ volume: "m³" }, 12)).toBe("m³");
  });

  it("is m³ from 1000 L on where nothing known was chosen", () => {
    expect(shownVolumeUnit({}, 310_700)).toBe("m³");
    expect(shownVolumeUnit({}, 1000)).toBe("m³");
    expect(shownVolumeUnit({ volume: "bucket" }, 999.9)).toBe("L");
    expect(shownVolumeUnit({}, null)).toBe("L");
  });

  it("is litres where volumes are typed, unless the person chose otherwise", () => {
    expect(readingUnits({}).volume).toBe("L");
  });
});
