import type { Metadata } from "next";
import Link from "next/link";
import { askPage } from "@/app/_server/session";
import { PageHead } from "@/lib/ui";
import { listWatch, summariseSeries } from "@/modules/measurements";
import { ChartChooser } from "@/modules/measurements/ui/chart-chooser";
import { getSystem } from "@/modules/systems";

type Props = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Charts of ${(await params).code}` };
}

const DAYS = 30;

export default async function SystemChartsPage({ params }: Props) {
  const system = await askPage(getSystem, await params);
  return (
    <>
      <PageHead
        title={`Charts of ${system.code}`}
        name={system.name}
        facts={<Link href="/charts">Charts of all systems</Link>}
      />
      <ChartChooser
        rows={await askPage(listWatch, { systemId: system.id, recent: 1 })}
        summaries={await askPage(summariseSeries, { days: DAYS, systemId: system.id })}
        days={DAYS}
        pointCodes={new Map(system.points.map((point) => [point.id, point.code]))}
        ofOneSystem
      />
    </>
  );
}
