import type { Page } from "@playwright/test";
import { expect, test } from "../support/browser";
import { withinRow } from "../support/within-row";

test.use({ signedInAs: "aquarist", viewport: { width: 768, height: 1024 } });

const counts = (page: Page) => page.getByRole("status").filter({ hasText: /\d+ waits? for you/ });

/** Opens the sheet of a system with something that can be read within; its line and its box. */
async function openSheet(page: Page) {
  const row = await withinRow(page.request);
  await page.goto(`/systems/${row.systemCode}/entry`);
  const line = page
    .getByRole("region", { name: row.systemCode, exact: true })
    .getByRole("listitem")
    .filter({ has: page.getByRole("heading", { name: row.parameterName, exact: true }) });
  return { ...row, line, box: line.getByRole("textbox") };
}

test("a value is typed with the decimal keypad, judged at once, sent on Enter, and the next box is in focus", async ({
  page,
}) => {
  const { systemCode, box, value } = await openSheet(page);
  await expect(page.getByRole("heading", { level: 1 })).toContainText(systemCode);
  await expect(box).toHaveAttribute("inputmode", "decimal");
  const height = (await box.locator("xpath=..").boundingBox())?.height ?? 0;
  expect(height).toBeGreaterThanOrEqual(54);
  await box.fill(value.replace(".", ","));
  await page.keyboard.press("Enter");
  await expect(counts(page)).toContainText("1 sent");
  await expect(page.locator("[data-entry]:focus")).toHaveCount(1);
});

test("a value that cannot be is not sent until somebody says that it really shows this; then it is explained", async ({
  page,
}) => {
  const { box } = await openSheet(page);
  await box.fill("99999");
  await page.keyboard.press("Enter");
  await page.keyboard.press("Enter");
  await expect(page.getByText("implausible").first()).toBeVisible();
  await expect(counts(page)).toContainText("0 sent");
  await expect(counts(page)).toContainText("1 waits for you");
  await page.getByRole("button", { name: "It really shows this" }).click();
  await expect(counts(page)).toContainText("1 sent");
  await page.getByRole("textbox", { name: /why is it off/ }).fill("The probe hung in the air.");
  await page.getByRole("button", { name: "Explain" }).click();
  await expect(page.getByText("The probe hung in the air. sent")).toBeVisible();
});

test("a value typed without a network is kept over a reload and sent when the network is back", async ({
  page,
  expectConsoleError,
}) => {
  expectConsoleError(/net::ERR_|Failed to load resource/);
  const { box, value } = await openSheet(page);
  await page.route("**/api/v1/readings", (route) => route.abort("internetdisconnected"));
  await box.fill(value);
  await page.keyboard.press("Enter");
  await expect(counts(page)).toContainText("1 not sent");
  page.on("dialog", (dialog) => void dialog.accept());
  await page.reload();
  await expect(counts(page)).toContainText("1 not sent");
  await page.unroute("**/api/v1/readings");
  await page.evaluate(() => window.dispatchEvent(new Event("online")));
  await expect(counts(page)).toContainText("1 sent");
  await expect(counts(page)).toContainText("0 not sent");
});

test("a reading is corrected with a reason; the old value stays beside the new one", async ({ page }) => {
  const { line, box, value, otherValue } = await openSheet(page);
  await box.fill(value);
  await page.keyboard.press("Enter");
  await line.getByRole("link", { name: "Correct…" }).click();
  await page.getByRole("button", { name: "Correct…" }).click();
  const dialog = page.getByRole("dialog", { name: "Correct this reading" });
  await dialog.getByRole("button", { name: "Put the new value beside it" }).click();
  await expect(dialog.getByText("Type the new value.")).toBeVisible();
  await dialog.getByRole("textbox", { name: "New value" }).fill(otherValue);
  await dialog.getByRole("textbox", { name: "Why" }).fill("Misread the last digit.");
  await dialog.getByRole("button", { name: "Put the new value beside it" }).click();
  const versions = page.getByRole("table", { name: "Versions of this reading" });
  await expect(versions.getByRole("row")).toHaveCount(3);
  await expect(versions).toContainText(value);
  await expect(versions).toContainText(otherValue);
  await expect(versions).toContainText("Misread the last digit.");
});
