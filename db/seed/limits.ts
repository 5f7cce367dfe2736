import type { z } from "zod";
import { decideLimits, planWatch, proposeLimits, saveLimitTemplate } from "@/modules/measurements";
import type { limitShapeInput } from "@/modules/measurements/input";
import type { Bounds } from "@/modules/measurements/model";
import { DAYS, type Stage } from "./stage";
import { type SeriesSeed, SYSTEMS, type SystemSeed } from "./systems.data";

type Shape = z.input<typeof limitShapeInput>;

const around = (target: number, watch: number, tolerance: number): Bounds => ({
  target,
  watchLow: target - watch,
  watchHigh: target + watch,
  toleranceLow: target - tolerance,
  toleranceHigh: target + tolerance,
});

/** The seal pool follows the sea, the larvae are warmed from 12 to 16 °C over 92 days; everything else stays. */
function shapeOf(stage: Stage, system: SystemSeed, series: SeriesSeed): Shape | null {
  if (system.code === "SEAL-01" && series.parameter === "temperature") {
    return {
      kind: "season",
      knots: [
        { monthDay: "02-20", bounds: around(8, 3.5, 5) },
        { monthDay: "08-20", bounds: around(16, 3.5, 5) },
      ],
    };
  }
  if (system.code === "LARV-01" && series.parameter === "temperature") {
    const knot = (daysAgo: number, target: number) => ({
      at: stage.moment(daysAgo, "06:00"),
      bounds: around(target, 0.8, 1.4),
    });
    return { kind: "ramp", knots: [knot(100, 12), knot(8, 16)] };
  }
  return series.limits ? { kind: "constant", bounds: series.limits } : null;
}

/** What is read where, and the first limits: one workbook, proposed by the analyst, approved by a lead. */
export async function seedLimits(stage: Stage): Promise<void> {
  const at = stage.moment(DAYS + 1, "09:00");
  const rows = SYSTEMS.flatMap((system) =>
    system.series.flatMap((series) => {
      const shape = shapeOf(stage, system, series);
      if (!shape) return [];
      const pointId = stage.point(system.code, series.point);
      return [{ pointId, parameterId: stage.parameter(series.parameter), effectiveFromAt: at, shape }];
    }),
  );
  const first = {
    title: "First limits of all systems",
    reason: "Limits of the paper sheets, agreed with the veterinarian.",
    rows,
  };
  const { workbookId } = stage.act("priya", at, proposeLimits, first);
  stage.act("ines", at + 5_400_000, decideLimits, {
    workbookId,
    decision: "approve",
    comment: "Checked against the sheets.",
  });
  await stage.settle();
  for (const system of SYSTEMS) planSystem(stage, system, at + 6_000_000);
  const reef = SYSTEMS.find((system) => system.code === "REEF-01");
  const templateRows = (reef?.series ?? []).flatMap((series) =>
    series.limits
      ? [
          {
            parameterId: stage.parameter(series.parameter),
            shape: { kind: "constant" as const, bounds: series.limits },
          },
        ]
      : [],
  );
  const once = templateRows.filter(
    (row, index) => templateRows.findIndex((each) => each.parameterId === row.parameterId) === index,
  );
  stage.act("priya", at + 6_600_000, saveLimitTemplate, {
    name: "Reef exhibit",
    note: "For new reef systems.",
    rows: once,
  });
}

function planSystem(stage: Stage, system: SystemSeed, at: number): void {
  const points = new Set(system.series.map((series) => series.point));
  for (const code of points) {
    const items = system.series
      .filter((series) => series.point === code)
      .map((series) => ({
        parameterId: stage.parameter(series.parameter),
        everyDays: series.everyDays,
        methodId: stage.methodIds.get(series.parameter) ?? null,
        instrumentId: instrumentFor(stage, series.parameter),
      }));
    stage.act("ines", at, planWatch, { pointId: stage.point(system.code, code), items });
  }
}

const INSTRUMENT_OF: Readonly<Record<string, string>> = {
  temperature: "TH-01",
  salinity: "RF-01",
  ph_nbs: "PH-01",
  oxygen: "OX-01",
  orp: "RX-01",
  ammonia_n: "PM-01",
  nitrate: "PM-01",
};

/** The instrument that a parameter is read with by default. */
export function instrumentFor(stage: Stage, parameter: string): number | null {
  return stage.instrumentIds.get(INSTRUMENT_OF[parameter] ?? "") ?? null;
}

/** Later changes: quarantine two stands empty, and a tighter oxygen limit waits for a lead. */
export function seedLimitStory(stage: Stage): void {
  const from = stage.moment(50, "12:00");
  stage.plan(from, async () => {
    const empty = SYSTEMS.find((system) => system.code === "QUAR-02");
    const { workbookId } = stage.act("samuel", from, proposeLimits, {
      title: "Quarantine two stands empty",
      reason: "No animals since the wrasses moved; limits rest until the next arrival.",
      rows: (empty?.series ?? [])
        .filter((series) => series.limits)
        .map((series) => ({
          pointId: stage.point("QUAR-02"),
          parameterId: stage.parameter(series.parameter),
          effectiveFromAt: from,
          shape: { kind: "constant" as const, bounds: {} },
          suspendedReason: "No animals in the system.",
        })),
    });
    stage.act("ines", from + 1_800_000, decideLimits, { workbookId, decision: "approve", comment: "" });
    await stage.settle();
  });
  const lately = stage.moment(1, "14:30");
  stage.plan(lately, () => {
    stage.act("samuel", lately, proposeLimits, {
      title: "Oxygen at the bottom, kelp forest",
      reason: "Two low readings this week; the wolf eels rest at the bottom.",
      rows: [
        {
          pointId: stage.point("KELP-01", "BOTTOM"),
          parameterId: stage.parameter("oxygen"),
          effectiveFromAt: stage.moment(0, "06:00"),
          shape: {
            kind: "constant",
            bounds: {
              target: 7.4,
              watchLow: 6.8,
              toleranceLow: 6.4,
              toleranceHigh: 9.8,
              greatestChange24h: 1.5,
            },
          },
        },
      ],
    });
  });
}
