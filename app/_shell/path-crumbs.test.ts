import { describe, expect, it } from "vitest";
import { pathCrumbs } from "./path-crumbs";

const MENU = [
  { href: "/setup", label: "Setup" },
  { href: "/systems", label: "Systems" },
];

describe("crumbs of a path", () => {
  it("name the menu entry, then the parts below it; the last is where you are and no link", () => {
    expect(pathCrumbs("/setup/people", MENU)).toEqual([
      { label: "Setup", href: "/setup" },
      { label: "People" },
    ]);
    expect(pathCrumbs("/setup", MENU)).toEqual([{ label: "Setup" }]);
  });

  it("leave out a number, and keep the way back to its list", () => {
    expect(pathCrumbs("/setup/people/3", MENU)).toEqual([
      { label: "Setup", href: "/setup" },
      { label: "People", href: "/setup/people" },
    ]);
  });

  it("keep a code as it is and decode what the address had to encode", () => {
    expect(pathCrumbs("/systems/KELP-01", MENU).at(-1)).toEqual({ label: "KELP-01" });
    expect(pathCrumbs("/systems/KELP%2001", MENU).at(-1)).toEqual({ label: "KELP 01" });
  });

  it("make words of an unknown part, and none of the root", () => {
    expect(pathCrumbs("/setup/day-parts", MENU).at(-1)).toEqual({ label: "Day parts" });
    expect(pathCrumbs("/", MENU)).toEqual([]);
  });

  it("do not fail on an address that is not well encoded", () => {
    expect(pathCrumbs("/systems/%E0%A4%A", MENU).at(-1)).toEqual({ label: "%E0%A4%A" });
  });
});
