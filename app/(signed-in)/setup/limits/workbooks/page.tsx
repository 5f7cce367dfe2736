import type { Metadata } from "next";
import { askPage } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { PageHead } from "@/lib/ui";
import { listPersonNames } from "@/modules/identity";
import { listLimitWorkbooks } from "@/modules/measurements";
import { LimitWorkbooksTable } from "@/modules/measurements/ui/limit-workbooks-table";

export const metadata: Metadata = { title: "Changes of limits" };

export default async function LimitWorkbooksPage() {
  const people = await askPage(listPersonNames, {});
  return (
    <>
      <PageHead title="Changes of limits" facts="Every workbook of limits, newest first." />
      <LimitWorkbooksTable
        workbooks={await askPage(listLimitWorkbooks, {})}
        names={Object.fromEntries(people.map(({ id, name }) => [id, name]))}
        zone={settings().STILLWELL_ZONE}
        caption="Workbooks of limits, newest first"
        emptyText="No limits have been proposed yet."
      />
    </>
  );
}
