import type { Metadata } from "next";
import { askPage } from "@/app/_server/session";
import { PageHead } from "@/lib/ui";
import { listWatch, summariseSeries } from "@/modules/measurements";
import { ChartChooser } from "@/modules/measurements/ui/chart-chooser";
import { listPoints } from "@/modules/systems";

export const metadata: Metadata = { title: "Charts" };

const DAYS = 30;

export default async function ChartsPage() {
  const points = await askPage(listPoints, {});
  return (
    <>
      <PageHead
        title="Charts"
        facts={`What is read, by area and system, and how it did in the last ${DAYS} days. A reading speaks for the time until the next one, for two days at most.`}
      />
      <ChartChooser
        rows={await askPage(listWatch, { recent: 1 })}
        summaries={await askPage(summariseSeries, { days: DAYS })}
        days={DAYS}
        pointCodes={new Map(points.map((point) => [point.id, point.code]))}
      />
    </>
  );
}
