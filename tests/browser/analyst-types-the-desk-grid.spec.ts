import type { Locator, Page } from "@playwright/test";
import { expect, test } from "../support/browser";
import { withinRow } from "../support/within-row";

test.use({ signedInAs: "analyst" });

const WANTED = 96;

/** Opens the sheet with every area on it, so that there are cells enough. */
async function openSheet(page: Page): Promise<void> {
  await page.goto("/rounds/grid");
  await expect(page.getByRole("heading", { level: 1, name: "Desk grid" })).toBeVisible();
  const areas = page.getByRole("navigation", { name: "Areas on the sheet" });
  for (;;) {
    const off = areas.getByRole("link", { name: /put it on the sheet$/ });
    const left = await off.count();
    if (left === 0) break;
    await off.first().click();
    await expect(off).toHaveCount(left - 1);
  }
  await expect(page.locator(".desk-cell").first()).toBeVisible();
}

const counts = (page: Page) => page.getByRole("status").filter({ hasText: /\d+ waits? for you/ });
const focused = (page: Page): Locator => page.locator(".ag-cell-focus");
const firstCell = (page: Page) => page.locator('.ag-row[row-index="0"] .ag-cell:has(.desk-last)').first();

/** Types the last value of the cell in focus again (it stands in the empty cell), or an answer where there is none. */
async function typeAgain(page: Page): Promise<void> {
  const cell = focused(page);
  const last = cell.locator(".desk-last");
  const text = (await last.count()) > 0 ? await last.innerText() : "ND";
  await page.keyboard.type(text.replace("\u2212", "-").replaceAll("\u202f", ""));
}

test("96 values are typed by the keyboard alone, and each is stored", async ({ page }) => {
  test.setTimeout(180_000);
  await openSheet(page);
  await firstCell(page).click();
  let typed = 0;
  for (let step = 0; typed < WANTED && step < 4 * WANTED; step += 1) {
    const hasLast = (await focused(page).locator(".desk-last").count()) > 0;
    if (hasLast) {
      await typeAgain(page);
      await page.keyboard.press("Enter");
      typed += 1;
      // a value that is off waits in its cell: the second Enter says that it really shows this
      if ((await focused(page).locator('[data-need="confirm"]').count()) > 0)
        await page.keyboard.press("Enter");
    } else {
      await page.keyboard.press("Enter");
    }
  }
  expect(typed, "the demonstration has cells enough").toBe(WANTED);
  await expect(counts(page)).toContainText(`${WANTED} sent`);
  await expect(counts(page)).toContainText("0 wait for you");
  await expect(counts(page)).toContainText("0 not sent");
});

test("a value that is off waits until the second Enter; a slip is offered and not applied", async ({
  page,
}) => {
  await openSheet(page);
  await firstCell(page).click();
  await page.keyboard.type("99999");
  await page.keyboard.press("Enter");
  await expect(focused(page)).toContainText(/implausible|out of tolerance/);
  await expect(counts(page)).toContainText("1 waits for you");
  await expect(counts(page)).toContainText("0 sent");
  await page.keyboard.press("Control+z");
  await expect(counts(page)).toContainText("0 wait for you");
  await page.keyboard.press("Control+y");
  await expect(counts(page)).toContainText("1 waits for you");
  await page.keyboard.press("Enter");
  await expect(counts(page)).toContainText("1 sent");
  await expect(counts(page)).toContainText("0 wait for you");
});

test("a block from a spreadsheet is held until each value can be used, then goes together", async ({
  page,
}) => {
  await openSheet(page);
  await firstCell(page).click();
  const [systemCode, parameterName] = (await page.locator(".desk-cell-line b").innerText()).split(", ");
  const { value: good } = await withinRow(page.request, { systemCode, parameterName });
  await page.evaluate((text) => {
    const clipboardData = new DataTransfer();
    clipboardData.setData("text/plain", text);
    const event = new ClipboardEvent("paste", { clipboardData, bubbles: true, cancelable: true });
    document.activeElement?.dispatchEvent(event);
  }, `${good}\nwarm\n`);
  await expect(page.getByText("2 pasted, not sent.")).toBeVisible();
  await expect(page.getByRole("button", { name: "Send 2 pasted" })).toBeDisabled();
  await expect(page.getByText("“warm” is not a number.")).toBeVisible();
  await expect(counts(page)).toContainText("0 sent");
  await page.getByRole("button", { name: /^Empty / }).click();
  await page.getByRole("button", { name: "Send 1 pasted" }).click();
  await expect(counts(page)).toContainText("1 sent");
});
