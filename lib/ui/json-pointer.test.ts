import { describe, expect, it } from "vitest";
import { pointerToPath } from "./json-pointer";

describe("a JSON pointer as a form path", () => {
  // Escapes and order of unescaping: RFC 6901, section 4 (~1 first, then ~0) and the examples of section 5.
  it("unescapes as RFC 6901 says", () => {
    expect(pointerToPath("/foo/0")).toBe("foo.0");
    expect(pointerToPath("/a~1b")).toBe("a/b");
    expect(pointerToPath("/m~0n")).toBe("m~n");
    expect(pointerToPath("/~01")).toBe("~1");
    expect(pointerToPath("#/c%25d")).toBe("c%d");
  });
  it("gives nothing for the whole document", () => {
    expect(pointerToPath("")).toBe("");
  });
});
