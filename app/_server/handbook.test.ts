import { describe, expect, it } from "vitest";
import { helpPages, readHelpPage } from "./handbook";

describe("the handbook", () => {
  it("has a page for each role's day and begins with what the product is not", () => {
    const pages = helpPages("handbook");
    expect(pages[0]?.slug).toBe("safety");
    for (const role of [
      "aquarist",
      "operator",
      "analyst",
      "lead",
      "veterinarian",
      "auditor",
      "administrator",
      "reader",
    ]) {
      expect(pages.map((page) => page.slug)).toContain(role);
    }
    const safety = readHelpPage("handbook", "safety")?.html ?? "";
    for (const words of ["not a life-safety alarm", "is a proposal", "procedures come first"])
      expect(safety).toContain(words);
  });

  it("shows every page of both shelves, with one title and no heading twice", () => {
    for (const shelf of ["handbook", "formulas"] as const) {
      expect(helpPages(shelf).length).toBeGreaterThan(9);
      for (const { slug } of helpPages(shelf)) {
        const page = readHelpPage(shelf, slug);
        expect(page?.title, slug).toBeTruthy();
        expect(page?.html, slug).not.toMatch(/<h1|<script|<img|style=/);
        const ids = page?.headings.map((heading) => heading.id) ?? [];
        expect(new Set(ids).size, slug).toBe(ids.length);
      }
    }
  });

  it("wraps tables so that they scroll by themselves", () => {
    const words = readHelpPage("handbook", "words")?.html ?? "";
    expect(words).toMatch(
      /<div class="table-scroll"[^>]*><table class="data-table"><thead><tr><th scope="col">word<\/th>/,
    );
  });

  it("has no page outside its shelves", () => {
    for (const slug of ["../formulas/seawater-density", "safety.md", "", "nothing", "..", "%2e%2e"]) {
      expect(readHelpPage("handbook", slug), slug).toBeNull();
    }
  });
});
