import { readdirSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { pathCrumbs } from "./path-crumbs";

const MENU = [
  { href: "/setup", label: "Setup" },
  { href: "/systems", label: "Systems" },
];

/** A part of an address for each bracketed folder of app/(signed-in). */
const SAMPLES: Readonly<Record<string, string>> = {
  areaCode: "SHORE",
  code: "KELP-01",
  day: "2026-07-14",
  entryId: "7",
  incidentId: "7",
  key: "7",
  page: "one-page",
  parameter: "temperature",
  personId: "7",
  readingId: "7",
  table: "reading",
  workbookId: "7",
};

/** An address of every page somebody who has signed in can open. */
function pageAddresses(): string[] {
  const folder = path.resolve(import.meta.dirname, "../(signed-in)");
  const files = readdirSync(folder, { recursive: true, encoding: "utf8" });
  const pages = files.filter((file) => path.basename(file) === "page.tsx");
  return pages.map((file) => {
    const parts = path.dirname(file).split(path.sep);
    return `/${parts.map((part) => part.replace(/^\[(\w+)\]$/, (_, name: string) => SAMPLES[name] ?? "?")).join("/")}`;
  });
}

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

  it("write a day as it is read, and leave what is no day", () => {
    expect(pathCrumbs("/rounds/KELP/2026-11-30", MENU).at(-1)).toEqual({ label: "30 Nov 2026" });
    expect(pathCrumbs("/rounds/KELP/2026-02-30", MENU).at(-1)?.label).not.toContain("Feb");
  });

  it("make words of an unknown part, and none of the root", () => {
    expect(pathCrumbs("/setup/day-parts", MENU).at(-1)).toEqual({ label: "Day parts" });
    expect(pathCrumbs("/", MENU)).toEqual([]);
  });

  it("do not fail on an address that is not well encoded", () => {
    expect(pathCrumbs("/systems/%E0%A4%A", MENU).at(-1)).toEqual({ label: "%E0%A4%A" });
  });

  it("link only to pages that exist, from every page that exists", () => {
    const pages = pageAddresses();
    expect(pages.filter((page) => page.includes("?"))).toEqual([]);
    expect(pages).toContain("/rounds/SHORE/2026-07-14");
    const links = pages.flatMap((page) => pathCrumbs(page, MENU).map(({ href }) => ({ page, href })));
    const dead = links.filter(({ href }) => href !== undefined && !pages.includes(href));
    expect(dead).toEqual([]);
  });

  it("keep the words of a step that has no page", () => {
    expect(pathCrumbs("/rounds/SHORE/2026-07-14", MENU)).toEqual([
      { label: "Rounds", href: "/rounds" },
      { label: "SHORE" },
      { label: "14 Jul 2026" },
    ]);
    expect(pathCrumbs("/readings/12", MENU)).toEqual([{ label: "Readings" }]);
  });
});
