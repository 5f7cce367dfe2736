import { cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { GeometryEditor } from "./geometry-editor";

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const box = (name: string) => screen.getByRole("textbox", { name });
const type = (name: string, value: string) => fireEvent.change(box(name), { target: { value } });
const press = (name: string) => fireEvent.click(screen.getByRole("button", { name }));
const total = () => screen.getByRole("status").textContent;

function open() {
  const fetch = vi.fn(async (_url: string, _init: RequestInit) => new Response('{"data":{"id":1}}'));
  vi.stubGlobal("fetch", fetch);
  const onDone = vi.fn();
  const units = { length: "m", volume: "L" } as const;
  render(
    <GeometryEditor
      systemId={7}
      begin={[]}
      units={units}
      zone="Europe/London"
      onClose={() => {}}
      onDone={onDone}
    />,
  );
  return { fetch, onDone };
}

function fillBox() {
  type("Inner length", "2");
  type("Inner width", "1");
  type("Inner height", "1");
  type("Depth of water", "0,5");
}

describe("the geometry editor", () => {
  // By hand: 2 × 1 × 0.5 m = 1,000 L; u = 5 L, so ± 10 L (k = 2); 2 m² of surface, 20 L a centimetre.
  it("moves the total with every figure typed", () => {
    open();
    fillBox();
    expect(total()).toContain("1000");
    type("Standard uncertainty of inner length", "0.01");
    expect(total()).toContain("± 10 (k = 2)");
    expect(total()).toContain("a centimetre of level is 20 L");
  });

  it("names every field that is missing and sends nothing", () => {
    const { fetch } = open();
    press("Propose this volume");
    for (const missing of [
      "Inner length is missing.",
      "Inner width is missing.",
      "Inner height is missing.",
    ]) {
      expect(screen.getByText(missing)).toBeDefined();
    }
    expect(fetch).not.toHaveBeenCalled();
  });

  it("says at once that the water stands higher than the tank", () => {
    open();
    fillBox();
    type("Depth of water", "1.5");
    expect(screen.getByText(/The water stands higher than the tank/)).toBeDefined();
    expect(total()).not.toContain("1000");
  });

  it("sends what was typed, as typed", async () => {
    const { fetch, onDone } = open();
    fillBox();
    press("Propose this volume");
    await waitFor(() => expect(onDone).toHaveBeenCalledOnce());
    await screen.findByRole("button", { name: "Propose this volume" });
    const [path, init] = fetch.mock.calls[0] ?? [];
    expect(path).toBe("/api/v1/volumes");
    expect(JSON.parse(String(init?.body))).toMatchObject({
      method: "geometry",
      systemId: 7,
      components: [{ name: "Main tank", shape: "box", fillDepth: { text: "0,5" }, isAtSurface: true }],
    });
  });
});
