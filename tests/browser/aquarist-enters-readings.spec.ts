import type { Page } from "@playwright/test";
import { expect, test } from "../support/browser";

test.use({ signedInAs: "aquarist", viewport: { width: 768, height: 1024 } });

/** The code of a system that this person may enter readings for, as the product itself says it. */
async function someSystem(page: Page): Promise<string> {
  const answer = await page.request.get("/api/v1/watch?recent=1");
  expect(answer.ok()).toBe(true);
  const { data } = (await answer.json()) as {
    data: {
      systemCode: string;
      systemState: string;
      parameter: { kind: string };
      recent: { value: number | null }[];
    }[];
  };
  const found = data.find((row) => row.parameter.kind === "number" && row.recent[0]?.value != null);
  if (!found) throw new Error("the demonstration has something to read in this person's area");
  return found.systemCode;
}

const counts = (page: Page) => page.getByRole("status").filter({ hasText: "not sent" });

/** The first line with a number box and a last value, and that value. */
async function firstNumber(page: Page) {
  const line = page
    .getByRole("listitem")
    .filter({ has: page.locator('input[inputmode="decimal"]'), hasText: /last [\d−]/ })
    .first();
  const last = (await line.getByText(/^last /).innerText()).replace("−", "-");
  const value = /last\s+(-?[\d.]+)/.exec(last)?.[1] ?? "";
  return { line, value, box: line.getByRole("textbox") };
}

test("a value is typed with the decimal keypad, judged at once, sent on Enter, and the next box is in focus", async ({
  page,
}) => {
  const code = await someSystem(page);
  await page.goto(`/systems/${code}/entry`);
  await expect(page.getByRole("heading", { level: 1 })).toContainText(code);
  const { box, value } = await firstNumber(page);
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
  const code = await someSystem(page);
  await page.goto(`/systems/${code}/entry`);
  const { box } = await firstNumber(page);
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
  const code = await someSystem(page);
  await page.goto(`/systems/${code}/entry`);
  const { box, value } = await firstNumber(page);
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
  const code = await someSystem(page);
  await page.goto(`/systems/${code}/entry`);
  const { box, value } = await firstNumber(page);
  await box.fill(value);
  await page.keyboard.press("Enter");
  await page.getByRole("link", { name: "Correct…" }).first().click();
  await page.getByRole("button", { name: "Correct…" }).click();
  const dialog = page.getByRole("dialog", { name: "Correct this reading" });
  await dialog.getByRole("button", { name: "Put the new value beside it" }).click();
  await expect(dialog.getByText("Type the new value.")).toBeVisible();
  await dialog.getByRole("textbox", { name: "New value" }).fill(`${value}1`);
  await dialog.getByRole("textbox", { name: "Why" }).fill("Misread the last digit.");
  await dialog.getByRole("button", { name: "Put the new value beside it" }).click();
  const versions = page.getByRole("table", { name: "Versions of this reading" });
  await expect(versions.getByRole("row")).toHaveCount(3);
  await expect(versions).toContainText("Misread the last digit.");
});
