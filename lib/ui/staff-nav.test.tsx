import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { currentHref } from "./current-entry";
import { StaffNav } from "./staff-nav";

vi.mock("next/navigation", () => ({ usePathname: () => "/systems/12" }));
// jsdom has no CSS.escape; ids here need no escaping
vi.stubGlobal("CSS", { escape: (text: string) => text });
afterEach(cleanup);

const items = [
  { href: "/today", label: "Today" },
  { href: "/systems", label: "Systems" },
];

describe("the menu", () => {
  it("marks the entry the path belongs to, and it alone", () => {
    render(<StaffNav mark="Stillwell" items={items} footItems={[{ href: "/help", label: "Help" }]} />);
    const current = screen
      .getAllByRole("link")
      .filter((link) => link.getAttribute("aria-current") === "page");
    expect(current.map((link) => link.textContent)).toEqual(["Systems"]);
  });

  it("opens as a sheet from the bar and closes again", async () => {
    render(<StaffNav mark="Stillwell" items={items} currentPath="/today" />);
    fireEvent.click(screen.getByRole("button", { name: /Menu/ }));
    const sheet = await screen.findByRole("dialog", { name: "Main menu" });
    expect(
      within(sheet)
        .getAllByRole("link")
        .map((link) => link.textContent),
    ).toEqual(["Today", "Systems"]);
    fireEvent.click(within(sheet).getByRole("button", { name: "Close" }));
    expect(screen.queryByRole("dialog")).toBeNull();
  });
});

describe("the current entry", () => {
  it("is the longest that holds the path, never one that only begins alike", () => {
    const all = [{ href: "/" }, { href: "/systems" }, { href: "/systems/map" }];
    expect(currentHref(all, "/systems/map/3?x=1")).toBe("/systems/map");
    expect(currentHref(all, "/systemsx")).toBeUndefined();
    expect(currentHref(all, "/")).toBe("/");
  });
});
