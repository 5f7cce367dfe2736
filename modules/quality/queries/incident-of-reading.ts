import { eq } from "drizzle-orm";
import { z } from "zod";
import { notFound } from "@/lib/problem";
import { defineQuery } from "@/modules/audit";
import { reading } from "@/modules/measurements";
import { getParameter } from "@/modules/methods";
import { pointDirectory } from "@/modules/systems";
import { qualityMay } from "../abilities";
import { incident, incidentReading } from "../schema";
import { findOpenIncident, incidentRows } from "./list-incidents";

/**
 * What a reading has to do with incidents: the one it was joined to, or the open one about the same point and parameter, and
 * a title where one would be opened.
 */
export const incidentOfReading = defineQuery({
  name: "incidentOfReading",
  permission: qualityMay.read,
  input: z.strictObject({ readingId: z.coerce.number().int().positive() }),
  run(ctx, { readingId }) {
    const row = ctx.db.select().from(reading).where(eq(reading.id, readingId)).get();
    const place =
      row && ctx.db.select().from(pointDirectory).where(eq(pointDirectory.pointId, row.pointId)).get();
    if (!row || !place || (ctx.areaIds !== null && !ctx.areaIds.includes(place.areaId))) {
      throw notFound("such reading");
    }
    const link = ctx.db.select().from(incidentReading).where(eq(incidentReading.readingId, readingId)).get();
    const joined = link ? (incidentRows(ctx, eq(incident.id, link.incidentId), 1)[0] ?? null) : null;
    const { pointId, parameterId } = row;
    return {
      joined,
      open: joined === null ? findOpenIncident.run(ctx, { pointId, parameterId }) : null,
      proposedTitle: `${getParameter(ctx.db, parameterId).name} out of tolerance at ${place.systemCode}`,
    };
  },
});

export type IncidentOfReading = ReturnType<(typeof incidentOfReading)["run"]>;
