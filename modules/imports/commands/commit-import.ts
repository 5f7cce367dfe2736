import { and, eq, gt, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { openDelivery, publishDelivery, withdrawDelivery } from "@/modules/measurements";
import { pointDirectory } from "@/modules/systems";
import { importsMay } from "../abilities";
import { importsEvents } from "../events";
import { importIdInput, withdrawImportInput } from "../input";
import { getImportIn } from "../records";
import { importProgress, imports, stagedRow } from "../schema";
import { COMMIT_IMPORT } from "../work";

/** The areas of the systems for which readings are accepted, found by steps through the index of staged rows. */
function areasOfImport(db: Orm, importId: number): number[] {
  const pointIds: number[] = [];
  for (let last = -1; ; ) {
    const next = db.get<{ pointId: number } | undefined>(sql`
      select point_id as "pointId" from imports_staged_row
      where import_id = ${importId} and point_id > ${last} order by point_id limit 1`);
    if (!next) break;
    last = next.pointId;
    pointIds.push(last);
  }
  const areas = pointIds.map(
    (pointId) =>
      db
        .select({ areaId: pointDirectory.areaId })
        .from(pointDirectory)
        .where(eq(pointDirectory.pointId, pointId))
        .get()?.areaId,
  );
  return [...new Set(areas.filter((areaId) => areaId !== undefined))];
}

/** Commits what the check accepted: by this act the person confirms the values, also those out of tolerance. */
export const startCommit = defineCommand({
  verb: "startCommit",
  permission: importsMay.upload,
  input: importIdInput,
  areas: (ctx, { importId }) => areasOfImport(ctx.db, importId),
  run(ctx, { importId }) {
    invariant(ctx.actor.personId !== null, "a person commits an import");
    const row = getImportIn(ctx.db, importId, ["checked"]);
    if (row.acceptedCount === null || row.acceptedCount === 0) {
      throw new Problem(
        "conflict",
        `No reading of ${row.code} is accepted, so there is nothing to commit. Mend the file and upload it again.`,
      );
    }
    const { deliveryId } = openDelivery.run(ctx, { sourceRef: row.code }).result;
    ctx.db
      .update(imports)
      .set({ state: "committing", deliveryId, committedBy: ctx.actor.personId, commitStartedAt: ctx.at })
      .where(eq(imports.id, importId))
      .run();
    ctx.enqueue(COMMIT_IMPORT, { importId });
    return {
      result: { importId, deliveryId },
      event: {
        kind: importsEvents.commitStarted,
        subject: { type: "import", id: importId },
        payload: { code: row.code, accepted: row.acceptedCount, statuses: row.statusCounts },
      },
    };
  },
});

/** Makes the readings of an import visible, all at one moment, once every accepted one is brought in. */
export const finishCommit = defineCommand({
  verb: "finishCommit",
  permission: importsMay.upload,
  input: importIdInput,
  areas: () => [],
  run(ctx, { importId }) {
    const row = getImportIn(ctx.db, importId, ["committing"]);
    invariant(row.deliveryId !== null, "an import that is being committed has a delivery");
    const progress = ctx.db.select().from(importProgress).where(eq(importProgress.importId, importId)).get();
    invariant(progress, "an import that is being committed has been checked");
    const open = ctx.db
      .select({ id: stagedRow.id })
      .from(stagedRow)
      .where(
        and(
          eq(stagedRow.importId, importId),
          eq(stagedRow.outcome, "accepted"),
          gt(stagedRow.id, progress.committedId),
        ),
      )
      .limit(1)
      .get();
    if (open) throw new Problem("conflict", `Not all readings of ${row.code} are brought in yet.`);
    publishDelivery.run(ctx, { deliveryId: row.deliveryId });
    const { accepted, duplicate } = progress;
    ctx.db
      .update(imports)
      .set({ state: "committed", committedAt: ctx.at, acceptedCount: accepted, duplicateCount: duplicate })
      .where(eq(imports.id, importId))
      .run();
    return {
      result: { importId, accepted },
      event: {
        kind: importsEvents.committed,
        subject: { type: "import", id: importId },
        payload: { code: row.code, deliveryId: row.deliveryId, accepted, duplicate },
      },
    };
  },
});

/** Withdraws a committed import whole: none of its readings counts any more, all stay readable. */
export const withdrawImport = defineCommand({
  verb: "withdrawImport",
  permission: importsMay.withdraw,
  input: withdrawImportInput,
  run(ctx, { importId, reason }) {
    const row = getImportIn(ctx.db, importId, ["committed"]);
    invariant(row.deliveryId !== null, "a committed import has a delivery");
    withdrawDelivery.run(ctx, { deliveryId: row.deliveryId, reason });
    ctx.db
      .update(imports)
      .set({
        state: "withdrawn",
        withdrawnAt: ctx.at,
        withdrawnBy: ctx.actor.personId,
        withdrawnReason: reason,
      })
      .where(eq(imports.id, importId))
      .run();
    return {
      result: { importId },
      event: {
        kind: importsEvents.withdrawn,
        subject: { type: "import", id: importId },
        payload: { code: row.code, deliveryId: row.deliveryId },
        reason,
      },
    };
  },
});
