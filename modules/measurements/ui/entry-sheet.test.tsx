import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { systemClock } from "@/lib/clock";
import { aReading, aWatchRow, HOUR } from "@/tests/support/watch-row";
import { EntrySheet } from "./entry-sheet";

const NOW = systemClock.now();
let personId = 100;
let requests: { path: string; body: { readings?: Record<string, unknown>[] } & Record<string, unknown> }[] =
  [];
let isDown = false;

beforeEach(() => {
  personId += 1;
  requests = [];
  isDown = false;
  window.sessionStorage.clear();
  Element.prototype.scrollIntoView = () => undefined;
  vi.stubGlobal("fetch", async (path: string, init: RequestInit) => {
    if (isDown) throw new TypeError("Failed to fetch");
    const body = JSON.parse(String(init.body)) as (typeof requests)[number]["body"];
    requests.push({ path, body });
    const answers = (body.readings ?? []).map((each) => ({
      uuid: each.uuid,
      readingId: 41,
      isRepeat: false,
      status: each.confirmed ? "out" : "within",
      side: null,
      sentence: "",
      mustBeConfirmed: false,
    }));
    return new Response(JSON.stringify({ data: { readings: answers } }), { status: 200 });
  });
});

const rows = [
  aWatchRow({ id: 1, name: "Temperature", bounds: { toleranceLow: 12, toleranceHigh: 15 } }),
  aWatchRow({
    id: 2,
    name: "pH",
    unit: "pH",
    acceptedUnits: ["pH"],
    decimals: 2,
    mayBeNegative: false,
    plausible: { low: 0, high: 14 },
    recent: [8.1, 8.12, 8.09, 8.11, 8.1].map((value, day) =>
      aReading({ value, takenAt: NOW - (day + 1) * 25 * HOUR }),
    ),
  }),
  aWatchRow({
    id: 3,
    name: "Circulation pump",
    kind: "choice",
    unit: null,
    acceptedUnits: [],
    choices: [
      { code: "on", label: "on", means: "within" },
      { code: "off", label: "off", means: "out" },
    ],
  }),
];

function show(shown = rows) {
  render(
    <EntrySheet
      system={{ code: "KELP-01", name: "Kelp forest" }}
      rows={shown}
      people={[]}
      personId={personId}
      zone="Europe/London"
      now={NOW}
      nextCode="KELP-02"
    />,
  );
}
const box = (name: string) => screen.getByRole("textbox", { name: `KELP-01, ${name}` });
const line = (name: string) => screen.getByRole("heading", { name }).closest("li") as HTMLElement;
function type(name: string, text: string) {
  box(name).focus();
  fireEvent.change(box(name), { target: { value: text } });
  fireEvent.keyDown(box(name), { key: "Enter" });
}

describe("entry on a system's page", () => {
  it("offers the decimal keypad, and a ± key only where a value may be negative", () => {
    show();
    expect(box("Temperature").getAttribute("inputmode")).toBe("decimal");
    expect(within(line("Temperature")).getByRole("button", { name: /Change the sign/ })).toBeTruthy();
    expect(within(line("pH")).queryByRole("button", { name: /Change the sign/ })).toBeNull();
  });

  it("sends a value within its limits on Enter and goes on to the next box", async () => {
    show();
    type("Temperature", "13,4");
    expect(requests).toHaveLength(1);
    expect(requests[0]?.body.readings).toMatchObject([
      { typedText: "13,4", typedUnit: "°C", confirmed: false },
    ]);
    await waitFor(() => expect(document.activeElement).toBe(box("pH")));
    await waitFor(() => expect(line("Temperature").textContent).toContain("sent"));
    expect(screen.getByRole("status").textContent).toContain("1 sent");
  });

  it("says at once that a value is out, sends it only after it is confirmed, then asks why", async () => {
    show();
    type("Temperature", "18");
    expect(line("Temperature").textContent).toContain("out of tolerance");
    expect(line("Temperature").textContent).toContain("above 15.0");
    expect(requests).toEqual([]);
    fireEvent.keyDown(box("Temperature"), { key: "Enter" });
    expect(requests).toEqual([]);
    fireEvent.click(screen.getByRole("button", { name: "It really shows this" }));
    expect(requests[0]?.body.readings).toMatchObject([{ typedText: "18", confirmed: true }]);
    const why = await screen.findByRole("textbox", { name: /why is it off/ });
    fireEvent.change(why, { target: { value: "The chiller was off." } });
    fireEvent.click(screen.getByRole("button", { name: "Explain" }));
    await waitFor(() =>
      expect(requests.at(-1)).toMatchObject({
        path: "/api/v1/readings/41/explanation",
        body: { text: "The chiller was off." },
      }),
    );
  });

  // 1.8 × 13.4 + 32 = 56.12 °F; 12 to 15 °C = 53.6 to 59.0 °F; 60 °F is above 59.0 °F and below 15.6 °C
  it("shows last value, strip and limits in the unit that is typed, and sends what was typed", async () => {
    const inFahrenheit = {
      ...aWatchRow({
        acceptedUnits: ["°C", "°F"],
        bounds: { toleranceLow: 12, toleranceHigh: 15 },
        recent: [aReading({ value: 13.4, takenAt: NOW - 25 * HOUR })],
      }),
      unit: "°F",
    };
    show([inFahrenheit]);
    expect(line("Temperature").textContent).toContain("last 56.1°F");
    expect(screen.getByRole("img").getAttribute("aria-label")).toBe(
      "Temperature no value; tolerance 53.6 to 59.0; last 56.1",
    );
    fireEvent.change(box("Temperature"), { target: { value: "60" } });
    expect(line("Temperature").textContent).toContain("above 59.0");
    expect(screen.getByRole("img").getAttribute("aria-label")).toContain("Temperature 60.0 °F, out of");
    fireEvent.keyDown(box("Temperature"), { key: "Enter" });
    expect(line("Temperature").textContent).toContain("upper tolerance limit (59.0\u00a0°F)");
    fireEvent.change(box("Temperature"), { target: { value: "56.1" } });
    fireEvent.keyDown(box("Temperature"), { key: "Enter" });
    expect(requests[0]?.body.readings).toMatchObject([{ typedText: "56.1", typedUnit: "°F" }]);
    await waitFor(() => expect(line("Temperature").textContent).toContain("sent"));
    // another unit picked in the row: the row follows
    fireEvent.click(screen.getByRole("button", { name: "Measure again" }));
    fireEvent.change(screen.getByRole("combobox", { name: /Unit of/ }), { target: { value: "°C" } });
    expect(line("Temperature").textContent).toContain("last 13.4°C");
  });

  it("offers 8.12 for 81.2 and leaves it to the person", () => {
    show();
    type("pH", "81.2");
    expect((box("pH") as HTMLInputElement).value).toBe("81.2");
    fireEvent.click(within(line("pH")).getByText("8.12?"));
    expect((box("pH") as HTMLInputElement).value).toBe("8.12");
    expect(requests).toEqual([]);
    fireEvent.keyDown(box("pH"), { key: "Enter" });
    expect(requests[0]?.body.readings).toMatchObject([{ typedText: "8.12", confirmed: false }]);
  });

  it("hands a value over when its box is left, but not when the buttons under it are reached for", () => {
    show();
    fireEvent.change(box("Temperature"), { target: { value: "13" } });
    fireEvent.blur(box("Temperature"), { relatedTarget: box("pH") });
    expect(requests).toHaveLength(1);
    fireEvent.change(box("pH"), { target: { value: "81.2" } });
    fireEvent.blur(box("pH"), { relatedTarget: within(line("pH")).getByText("8.12?") });
    expect(requests).toHaveLength(1);
  });

  it("sends a check by one press, and asks again where the answer is off", () => {
    show();
    const pump = line("Circulation pump");
    fireEvent.click(within(pump).getByRole("button", { name: "off" }));
    expect(requests).toEqual([]);
    expect(pump.textContent).toContain("out of tolerance");
    fireEvent.click(within(pump).getByRole("button", { name: "on" }));
    expect(requests[0]?.body.readings).toMatchObject([{ typedText: "on", typedUnit: null }]);
  });

  it("keeps a value that cannot be sent, says so, and sends it when asked to", async () => {
    show();
    isDown = true;
    type("Temperature", "13.4");
    await waitFor(() => expect(line("Temperature").textContent).toContain("not sent yet"));
    expect(screen.getByRole("status").textContent).toContain("1 not sent");
    expect(window.sessionStorage.length).toBe(1);
    isDown = false;
    fireEvent.click(screen.getByRole("button", { name: "Send now" }));
    await waitFor(() => expect(screen.getByRole("status").textContent).toContain("0 not sent"));
    expect(requests).toHaveLength(1);
    expect(window.sessionStorage.length).toBe(0);
  });

  it("refuses what is no number with a sentence and keeps it in the box", () => {
    show();
    type("Temperature", "warm");
    expect(line("Temperature").textContent).toContain("is not a number");
    expect((box("Temperature") as HTMLInputElement).value).toBe("warm");
    expect(requests).toEqual([]);
  });
});
