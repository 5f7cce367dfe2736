import { and, eq, gte, lt } from "drizzle-orm";
import { DAY_MS, HOUR_MS, MINUTE_MS } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { correctReading, readingInForce, recordReadings } from "@/modules/measurements";
import {
  addIncidentNote,
  closeIncident,
  joinReading,
  openIncident,
  recordRecheck,
  setOwner,
  setRecheck,
} from "@/modules/quality";
import { uuidFor } from "./numbers";
import type { Stage } from "./stage";

/** The reading of a point and parameter on a day. */
function readingOn(
  stage: Stage,
  system: string,
  point: string | undefined,
  parameter: string,
  daysAgo: number,
): number {
  const from = stage.moment(daysAgo, "06:00");
  const row = stage.db.writer.orm
    .select({ id: readingInForce.id })
    .from(readingInForce)
    .where(
      and(
        eq(readingInForce.pointId, stage.point(system, point)),
        eq(readingInForce.parameterId, stage.parameter(parameter)),
        gte(readingInForce.takenAt, from),
        lt(readingInForce.takenAt, from + DAY_MS),
      ),
    )
    .get();
  invariant(row, `${system} ${parameter} was read ${daysAgo} days ago`);
  return row.id;
}

const key = (stage: Stage, who: string): number => stage.people.get(who) ?? 0;

/** A slip of the decimal point, noticed and corrected within the hour, 40 days ago. */
function slip(stage: Stage): void {
  const takenAt = stage.moment(40, "16:05");
  stage.plan(takenAt + MINUTE_MS, () => {
    const { readings } = stage.act("joy", takenAt + MINUTE_MS, recordReadings, {
      readings: [
        {
          uuid: uuidFor("slip"),
          pointId: stage.point("REEF-02"),
          parameterId: stage.parameter("ph_nbs"),
          typedText: "81.2",
          takenAt,
          instrumentId: stage.instrumentIds.get("PH-01") ?? null,
        },
      ],
    });
    stage.act("joy", takenAt + 20 * MINUTE_MS, correctReading, {
      readingId: readings[0]?.readingId ?? 0,
      uuid: uuidFor("slip corrected"),
      typedText: "8.12",
      reason: "Decimal point missed while typing with gloves.",
    });
  });
}

/** The chiller failed 96 days ago: an incident from opening to closure. */
function closedIncident(stage: Stage): void {
  const temperature = (daysAgo: number) => readingOn(stage, "COLD-01", undefined, "temperature", daysAgo);
  const at = stage.moment(96, "09:40");
  let incidentId = 0;
  const later = (daysAgo: number, time: string, scene: (moment: number) => void) => {
    const moment = stage.moment(daysAgo, time);
    stage.plan(moment, () => scene(moment));
  };
  stage.plan(at, () => {
    ({ incidentId } = stage.act("noor", at, openIncident, {
      readingId: temperature(96),
      title: "Cold-water coral too warm, chiller tripped",
      note: "High-pressure switch of chiller 1 had tripped. Spare chiller connected at 09:30.",
      recheckDueAt: at + 3 * HOUR_MS,
    }));
    stage.act("noor", at + 5 * MINUTE_MS, setOwner, { incidentId, ownerId: key(stage, "tomas") });
  });
  later(95, "09:30", (moment) =>
    stage.act("noor", moment, joinReading, { incidentId, readingId: temperature(95) }),
  );
  later(95, "13:00", (moment) =>
    stage.act("tomas", moment, addIncidentNote, {
      incidentId,
      text: "Contractor replaced the condenser fan; chiller 1 back in service.",
    }),
  );
  later(94, "09:35", (moment) =>
    stage.act("noor", moment, recordRecheck, { incidentId, readingId: temperature(94) }),
  );
  later(93, "10:15", (moment) =>
    stage.act("ines", moment, closeIncident, {
      incidentId,
      closureText:
        "Temperature back within limits for a day. Fan replaced; yearly cleaning of the condenser added to the plan.",
    }),
  );
}

/** Oxygen is low at the bottom of the kelp forest since two days: open, and the recheck is due today. */
function openOne(stage: Stage): void {
  const oxygen = (daysAgo: number) => readingOn(stage, "KELP-01", "BOTTOM", "oxygen", daysAgo);
  let incidentId = 0;
  const begun = stage.moment(2, "08:30");
  stage.plan(begun, () => {
    ({ incidentId } = stage.act("joy", begun, openIncident, {
      readingId: oxygen(2),
      title: "Oxygen low at the bottom of the kelp forest",
      note: "Surface is fine. Circulation pump 2 pulls 4.1 A, usually 6.",
      recheckDueAt: stage.moment(0, "10:30"),
    }));
    stage.act("joy", begun + 10 * MINUTE_MS, setOwner, { incidentId, ownerId: key(stage, "tomas") });
  });
  const next = stage.moment(1, "08:30");
  stage.plan(next, () => {
    stage.act("joy", next, joinReading, { incidentId, readingId: oxygen(1) });
    const text = "Suction strainer half blocked by kelp; cleaned. Current now 5.2 A.";
    stage.act("tomas", next + 150 * MINUTE_MS, addIncidentNote, { incidentId, text });
    stage.act("tomas", next + 155 * MINUTE_MS, setRecheck, {
      incidentId,
      recheckDueAt: stage.moment(0, "10:30"),
    });
  });
}

/** Yesterday a reading of five days ago was corrected: its signed sheet shows so and waits for review again. */
function lateCorrection(stage: Stage): void {
  const at = stage.moment(1, "17:10");
  stage.plan(at, () => {
    stage.act("noor", at, correctReading, {
      readingId: readingOn(stage, "ELAS-02", undefined, "salinity", 5),
      uuid: uuidFor("late correction"),
      typedText: "34.1",
      reason: "Brine-scale refractometer was used; read again from the log book.",
    });
  });
}

/** Everything that happened beside the rounds. */
export function seedStory(stage: Stage): void {
  slip(stage);
  closedIncident(stage);
  openOne(stage);
  lateCorrection(stage);
}
