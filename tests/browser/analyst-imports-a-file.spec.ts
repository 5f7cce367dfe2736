import AxeBuilder from "@axe-core/playwright";
import { expect, test } from "../support/browser";

test.use({ signedInAs: "analyst" });

/**
 * A file of its own for each run: two readings that can be taken, one that cannot, one twice; the day stands first or second,
 * and the comma is a decimal sign or parts thousands. */
function probeFile(system: string, parameter: string): string {
  const minute = 10 + (Date.now() % 49);
  const value = ((Date.now() % 8000) / 1000 + 10).toFixed(3).replace(".", ",");
  const at = (day: string) => `${day}/02/2026 09:${minute}`;
  return [
    "System;Parameter;Value;Taken at",
    `${system};${parameter};${value};${at("03")}`,
    `${system};${parameter};${value};${at("04")}`,
    `${system};${parameter};${value};${at("04")}`,
    `NOWHERE-99;${parameter};${value};${at("05")}`,
    "",
  ].join("\n");
}

test("an analyst imports a file, sees what was refused, commits it and withdraws it", async ({
  page,
  request,
  expectConsoleError,
}) => {
  expectConsoleError(/status of 4(15|09) .*\/api\/v1\/imports\?name=/);
  const systems = (await (await request.get("/api/v1/systems")).json()) as {
    data: { code: string; state: string }[];
  };
  const system = systems.data.find((each) => each.state === "in-service")?.code ?? "";
  const parameters = (await (await request.get("/api/v1/parameters")).json()) as {
    data: { code: string; name: string }[];
  };
  const parameter = parameters.data.find((each) => each.name === "Temperature")?.code ?? "";
  const file = {
    name: "probe-february.csv",
    mimeType: "text/csv",
    buffer: Buffer.from(probeFile(system, parameter)),
  };

  await page.goto("/imports");
  await expect(page.getByRole("heading", { name: "Imports", level: 1 })).toBeVisible();
  await page.getByLabel("File of readings").setInputFiles({
    name: "photo.csv",
    mimeType: "text/csv",
    buffer: Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13]),
  });
  await expect(page.getByRole("alert").filter({ hasText: /\w/ }).first()).toBeVisible();

  await page.getByLabel("File of readings").setInputFiles(file);
  await page.waitForURL(/\/imports\/I\d{2}-\d{4}$/);
  const code = page.url().split("/").at(-1) ?? "";
  await page.getByRole("radio", { name: /Day first/ }).check();
  await page.getByRole("button", { name: "Check the rows" }).click();
  await expect(page.getByText("Choose one of the readings.")).toBeVisible();
  await page.getByRole("radio", { name: /Decimal comma/ }).check();
  await page.getByRole("button", { name: "Check the rows" }).click();
  await expect(page.getByRole("heading", { name: "What was found" })).toBeVisible();
  await expect(page.getByText(/There is no system “NOWHERE-99”/)).toBeVisible();
  expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
  const download = page.waitForEvent("download");
  await page.getByRole("link", { name: "Download the refused" }).click();
  expect((await download).suggestedFilename()).toBe(`${code}-refused.csv`);

  await page.getByRole("button", { name: "Commit 2 readings" }).click();
  await expect(page.getByRole("heading", { name: "What came of it" })).toBeVisible();

  await page.goto("/imports");
  await page.getByLabel("File of readings").setInputFiles(file);
  await expect(page.getByText(new RegExp(`as ${code}; the same file adds nothing`))).toBeVisible();

  await page.getByRole("link", { name: `Open import ${code}` }).click();
  await page.getByRole("button", { name: "Withdraw this import" }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByRole("button", { name: "Withdraw" }).click();
  await expect(dialog.getByText("Say why in a few words.")).toBeVisible();
  await dialog.getByLabel("Reason").fill("The probe had drifted.");
  await dialog.getByRole("button", { name: "Withdraw" }).click();
  await expect(page.getByText("The probe had drifted.")).toBeVisible();
});
