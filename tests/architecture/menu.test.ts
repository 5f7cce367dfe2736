import { existsSync, readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { ALL_PERMISSIONS } from "@/app/_server/all-permissions";
import { homeOf, MENU, menuFor } from "@/app/_server/menu";
import { SETUP } from "@/app/(signed-in)/setup/sections.data";
import { type Actor, ROLES } from "@/modules/access";

const pageOf = (href: string) => `app/(signed-in)${href}/page.tsx`;

const actorWith = (roles: Actor["roles"]): Actor => ({
  kind: "person",
  personId: 1,
  name: "Ada Finch",
  roles,
  areaIds: null,
  sessionId: null,
});

describe("the menu", () => {
  it("has an entry only for a page that exists, and no entry twice", () => {
    const hrefs = MENU.map((entry) => entry.href);
    expect(hrefs.filter((href) => !existsSync(pageOf(href)))).toEqual([]);
    expect(new Set(hrefs).size).toBe(hrefs.length);
  });

  it("gives every role somewhere to land that it may see", () => {
    for (const role of ROLES) expect(existsSync(pageOf(homeOf(actorWith([role]))))).toBe(true);
  });

  it("shows somebody without a role only what is for everyone", () => {
    const { items, footItems } = menuFor(actorWith([]));
    expect([...items, ...footItems].every((entry) => entry.for === "everyone")).toBe(true);
  });
});

describe("setup", () => {
  const sections = SETUP.flatMap((group) => group.sections);

  it("lists only pages that exist, each once", () => {
    expect(sections.map((one) => one.href).filter((href) => !existsSync(pageOf(href)))).toEqual([]);
    expect(new Set(sections.map((one) => one.href)).size).toBe(sections.length);
  });

  it("lists every setup page but those that another one leads to", () => {
    const pages = readdirSync("app/(signed-in)/setup")
      .map((name) => `/setup/${name}`)
      .filter((href) => existsSync(pageOf(href)));
    expect(pages.length).toBeGreaterThan(0);
    expect(pages.filter((href) => !sections.some((one) => one.href === href))).toEqual([]);
  });
});

describe("the table of permissions", () => {
  it("holds every permission of every module, each code once", () => {
    const codes = ALL_PERMISSIONS.map((permission) => permission.code);
    expect(new Set(codes).size).toBe(codes.length);
    const known = new Set(codes.map((code) => code.split(".")[0]));
    const defined = readdirSync("modules")
      .map((name) => `modules/${name}/abilities.ts`)
      .filter((file) => existsSync(file))
      .map((file) => /definePermissions\(\s*"([\w-]+)"/.exec(readFileSync(file, "utf8"))?.[1]);
    expect(defined.length).toBeGreaterThan(0);
    expect(defined.filter((name) => name === undefined || !known.has(name))).toEqual([]);
  });

  it("says of each what it allows, in words that follow “Your role does not allow you to”", () => {
    for (const permission of ALL_PERMISSIONS) {
      expect(permission.says, permission.code).toMatch(/^[a-z][^.]*$/);
    }
  });
});
