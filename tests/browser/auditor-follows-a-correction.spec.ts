import { expect, test } from "../support/browser";

test.use({ signedInAs: "auditor" });

test("an auditor finds a correction, sees what it said before, and the record as it was", async ({
  page,
}) => {
  await page.goto("/history");
  await expect(page.getByRole("heading", { name: "History", level: 1 })).toBeVisible();
  await page.getByLabel("Action").selectOption({ label: "corrected a reading" });
  await page.getByRole("button", { name: "Search" }).click();
  await page.waitForURL(/verb=reading\.corrected/);

  const first = page.getByRole("link", { name: /corrected a reading/ }).first();
  const said = (await first.innerText()).trim();
  await first.click();
  await expect(page.getByRole("heading", { name: said, level: 1 })).toBeVisible();
  const change = page.getByRole("region", { name: /^Fields of reading/ });
  await expect(change.getByRole("columnheader", { name: /^Before/ })).toBeVisible();
  const typed = change.getByRole("row", { name: /^typed text/ });
  const [before, after] = await typed.getByRole("cell").allInnerTexts();
  expect(before).toBeTruthy();
  expect(after).not.toBe(before);

  await page.getByRole("link", { name: "All that happened to it" }).first().click();
  await expect(page.getByRole("heading", { name: /^History of reading/, level: 1 })).toBeVisible();
  // Both versions are told of: the reading as it was recorded, and its correction.
  await expect(page.getByRole("heading", { name: said, level: 2 })).toBeVisible();
  await expect(
    page.getByRole("heading", { name: /recorded readings|bulk of readings/, level: 2 }),
  ).toBeVisible();
  await page.getByLabel("Day and time").fill("2000-01-01T12:00");
  await page.getByRole("button", { name: "Show it as it was" }).click();
  await expect(page.getByText("There was no such record at 1 Jan 2000, 12:00:59")).toBeVisible();
});

test("an auditor saves the search as a file and has the whole history checked", async ({ page }) => {
  await page.goto("/history?verb=reading.corrected");
  const href = await page.getByRole("link", { name: "Save as CSV" }).getAttribute("href");
  const file = await page.request.get(href ?? "");
  expect(file.headers()["content-type"]).toContain("text/csv");
  const lines = (await file.text()).trim().split("\r\n");
  expect(lines[0]).toContain("entry,time (UTC),time (facility),person,what");
  expect(lines.length).toBeGreaterThan(1);
  expect(lines.slice(1).every((line) => line.includes("corrected a reading"))).toBe(true);

  await page.goto("/history/verification");
  await page.getByRole("button", { name: "Check it now" }).click();
  await expect(page.getByText(/^The history is whole, up to entry/).first()).toBeVisible({ timeout: 45_000 });
});

test("Help says what the product is not, and is searched by title", async ({ page }) => {
  await page.goto("/help");
  await expect(page.getByText("Stillwell is not a life-safety alarm")).toBeVisible();
  await page.getByLabel("Words of the title").fill("auditor");
  await page.getByRole("button", { name: "Search" }).click();
  await page.getByRole("link", { name: "An auditor's day" }).click();
  await expect(page.getByRole("heading", { name: "An auditor's day", level: 1 })).toBeVisible();
});
