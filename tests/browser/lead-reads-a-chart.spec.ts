import { readFile } from "node:fs/promises";
import { expect, test } from "../support/browser";

test.use({ signedInAs: "lead" });

test("a lead finds what is off, opens its chart, reads it by keyboard and takes its numbers along", async ({
  page,
}) => {
  await page.goto("/systems");
  await expect(page.getByRole("heading", { level: 1, name: "Systems" })).toBeVisible();
  await page.getByRole("searchbox", { name: "Search" }).fill("kelp-01");
  await expect(page.getByRole("row")).toHaveCount(2);
  await page.getByRole("link", { name: "KELP-01" }).click();

  await expect(page.getByRole("heading", { level: 1, name: "KELP-01" })).toBeVisible();
  await expect(page.getByText("Volume of record")).toBeVisible();
  await expect(page.getByRole("link", { name: "Enter readings" })).toBeVisible();
  const now = page.getByRole("region", { name: "Now" });
  await now.getByRole("link", { name: "Temperature", exact: true }).click();
  await expect(page).toHaveURL(/chart=\d+-temperature/);
  await page.getByRole("link", { name: "Open the chart" }).click();

  await expect(page.getByRole("heading", { level: 1, name: "Temperature" })).toBeVisible();
  const chart = page.getByRole("application", { name: /^Temperature, Surface, KELP-01: \d+ points from / });
  await expect(chart.locator("canvas")).toBeVisible();
  await chart.focus();
  await page.keyboard.press("ArrowLeft");
  // Whatever the newest reading says (another test may have typed it just now), the table says the same of it.
  const spoken = page.getByText(/^\d+ \w+ \d{4}, \d\d:\d\d: \d[\d\s]*\.\d °C/);
  await expect(spoken).toBeAttached();
  const [, moment = "", value = ""] = /^(.+, \d\d:\d\d): (.+) °C/.exec(await spoken.innerText()) ?? [];
  const newest = page.getByRole("region", { name: "Readings of the chart" }).getByRole("row").nth(1);
  await expect(newest.getByRole("rowheader")).toHaveText(moment);
  await expect(newest.getByRole("cell").first()).toContainText(value);

  const downloading = page.waitForEvent("download");
  await page.getByRole("link", { name: "CSV" }).click();
  const file = await (await downloading).path();
  const [head = "", first = ""] = (await readFile(file, "utf8")).split("\r\n");
  expect(head).toContain("value (°C)");
  expect(first).toMatch(/^KELP-01,Surface,temperature,/);

  const drawing = page.waitForEvent("download");
  await page.getByRole("button", { name: "PNG" }).click();
  const picture = await readFile(await (await drawing).path());
  expect(picture.subarray(1, 4).toString()).toBe("PNG");
});

test("control limits follow the baseline, say why there are none, and keep apart from tolerance", async ({
  page,
}) => {
  await page.goto("/systems/KELP-01/charts/temperature");
  const control = page.getByRole("region", { name: "Control limits" });
  await expect(control.getByText(/ISO 7870-2/)).toBeVisible();
  await expect(control.getByText("Upper control")).toBeVisible();
  const from = await control.getByLabel("Baseline from").inputValue();
  await control.getByLabel("to", { exact: true }).fill(from);
  await expect(control.getByText(/need at least 20/)).toBeVisible();
  await expect(control.getByText("Upper control")).toBeHidden();
  await expect(page).toHaveURL(new RegExp(`base-to=${from}`));
});

test("a period that is none is said so, and the address of nothing leads to the page that says that", async ({
  page,
  expectConsoleError,
}) => {
  await page.goto("/systems/KELP-01/charts/temperature?from=2026-02-30&to=2026-03-01");
  await expect(page.getByText(/A day in this address is none/)).toBeVisible();
  expectConsoleError(/404 \(Not Found\)/);
  const answer = await page.goto("/systems/KELP-01/charts/no-such-parameter");
  expect(answer?.status()).toBe(404);
});

test("charts are chosen by area and system", async ({ page }) => {
  await page.goto("/charts");
  await page.getByRole("heading", { name: "REEF-01" }).click();
  const table = page.getByRole("region", { name: "Charts of REEF-01" });
  await table.getByRole("link", { name: "Temperature of REEF-01" }).click();
  await expect(page).toHaveURL(/\/systems\/REEF-01\/charts\/temperature/);
});
