import { expect, test } from "../support/browser";
import { demoPerson } from "../support/demo-copy";

test.use({ signedInAs: "lead" });

const { password } = demoPerson("lead");

test("a lead finds what waits, sees what deviates first, and signs many sheets in one act", async ({
  page,
  expectConsoleError,
}) => {
  await page.goto("/today");
  await expect(page.getByRole("heading", { level: 1 })).toContainText("Today");
  await page.getByRole("link", { name: /day sheets? waits? for review/ }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Review" })).toBeVisible();

  const table = page.getByRole("region", { name: "Day sheets that wait" });
  const ticks = table.getByRole("checkbox");
  await expect(ticks.first()).toBeVisible();
  const first = table
    .getByRole("row")
    .filter({ has: page.getByRole("checkbox") })
    .first();
  const sheet = first.getByRole("link");
  const name = await sheet.innerText();
  const href = await sheet.getAttribute("href");
  expect(href).not.toBeNull();
  await ticks.first().check();
  await page.getByRole("button", { name: "Sign 1 sheet as reviewed…" }).click();

  const dialog = page.getByRole("dialog", { name: "Sign as reviewed" });
  await dialog.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(dialog.getByText("Type your password: it is your signature.")).toBeVisible();

  expectConsoleError("422");
  await dialog.getByLabel("Your password").fill("not the password");
  await dialog.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(dialog.getByText("The password is not right")).toBeVisible();

  await dialog.getByLabel("Your password").fill(password);
  await dialog.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(page.getByText("Signed as reviewed.").first()).toBeVisible();
  await expect(table.getByRole("link", { name, exact: true })).toHaveCount(0);

  await page.goto(href ?? "");
  await expect(page.getByRole("heading", { name: "What deviates" })).toBeVisible();
  const signatures = page.getByRole("region", { name: "Signatures" });
  await expect(signatures.getByText(/^Reviewed by/).last()).toContainText(demoPerson("lead").name);
  await expect(page.getByText("This sheet is reviewed.")).toBeVisible();
});

test("a sheet is returned only with a word on what is to be done", async ({ page }) => {
  await page.goto("/review");
  const table = page.getByRole("region", { name: "Day sheets that wait" });
  await table
    .getByRole("row")
    .filter({ has: page.getByRole("checkbox") })
    .last()
    .getByRole("link")
    .click();
  await page.getByRole("button", { name: "Return…" }).click();
  const dialog = page.getByRole("dialog", { name: "Return for more work" });
  await expect(dialog.getByLabel("What is to be done")).toBeVisible();
  await dialog.getByRole("button", { name: "Cancel" }).click();
  await expect(dialog).toHaveCount(0);
});

test.describe("somebody who does not review", () => {
  test.use({ signedInAs: "auditor" });

  test("sees what waits and has no way to sign", async ({ page }) => {
    await page.goto("/review");
    await expect(page.getByRole("heading", { level: 1, name: "Review" })).toBeVisible();
    await expect(page.getByRole("checkbox")).toHaveCount(0);
    await expect(page.getByRole("button", { name: /Sign/ })).toHaveCount(0);
  });
});
