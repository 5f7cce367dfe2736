import { describe, expect, it } from "vitest";
import { Pace } from "./pace";

describe("the pace of slices", () => {
  it("grows while slices are quick, up to its most", () => {
    const pace = new Pace(32, 100);
    pace.took(2, 32);
    expect(pace.size).toBe(64);
    pace.took(2, 64);
    expect(pace.size).toBe(100);
  });

  it("halves after a slice that was too long, down to its least", () => {
    const pace = new Pace(20, 500);
    pace.took(1, 20);
    pace.took(1, 40);
    pace.took(200, 80);
    expect(pace.size).toBe(40);
    for (let index = 0; index < 10; index += 1) pace.took(200, pace.size);
    expect(pace.size).toBe(20);
  });

  it("does not grow by a slice that was not full", () => {
    const pace = new Pace(32, 500);
    pace.took(1, 3);
    expect(pace.size).toBe(32);
  });
});
