import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import { Quantity } from "./quantity";
import { StatusWord } from "./status-word";
import { WellStrip } from "./well-strip";

afterEach(cleanup);

describe("the well strip", () => {
  it("says in words what it draws", () => {
    render(
      <WellStrip
        name="Oxygen"
        unit="mg/L"
        value={6.2}
        previous={7.9}
        target={8.5}
        toleranceLow={6.5}
        toleranceHigh={10.5}
        watchLow={7}
        status="out"
      />,
    );
    expect(screen.getByRole("img").getAttribute("aria-label")).toBe(
      "Oxygen 6.2 mg/L, out of tolerance; tolerance 6.5 to 10.5; watch limits at least 7.0; target 8.5; last 7.9",
    );
  });

  it("draws an arrowhead instead of the reading beyond the scale", () => {
    const { container } = render(
      <WellStrip value={81.2} decimals={2} toleranceLow={7.8} toleranceHigh={8.4} status="implausible" />,
    );
    expect(container.querySelector(".ws-beyond")).not.toBeNull();
    expect(container.querySelector(".ws-halo")).toBeNull();
  });

  it("draws a hard line only where there is a limit, and an empty tube when nothing is known", () => {
    const { container } = render(<WellStrip value={0.1} decimals={2} toleranceHigh={0.25} possibleLow={0} />);
    expect(container.querySelectorAll(".ws-limit")).toHaveLength(1);
    cleanup();
    const empty = render(<WellStrip name="Copper" />).container;
    expect(empty.querySelectorAll(".ws-band, .ws-meniscus, .ws-tick")).toHaveLength(0);
    expect(screen.getByRole("img").getAttribute("aria-label")).toBe("Copper no value");
  });
});

describe("a status word", () => {
  it("always has its word; all but within and no limits have a shape", () => {
    const shapes = (["within", "watch", "out", "implausible", "unjudged", "none"] as const).map((status) => {
      const { container } = render(<StatusWord status={status} direction="low" />);
      expect(container.textContent?.length).toBeGreaterThan(3);
      return container.querySelector("svg") !== null;
    });
    expect(shapes).toEqual([false, true, true, true, true, false]);
  });
  it("stays for assistive technology when within is kept quiet", () => {
    render(<StatusWord status="within" quietWhenWithin />);
    expect(screen.getByText("within").className).toBe("sr-only");
  });
});

describe("a quantity", () => {
  it("has its qualifier, a true minus sign and its unit, or says that there is no value", () => {
    expect(render(<Quantity value={-0.5} decimals={2} unit="°C" qualifier="<" />).container.textContent).toBe(
      "<\u22120.50°C",
    );
    cleanup();
    render(<Quantity value={null} decimals={1} />);
    expect(screen.getByText("no value")).toBeTruthy();
  });
});
