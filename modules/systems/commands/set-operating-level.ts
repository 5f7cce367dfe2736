import { eq } from "drizzle-orm";
import { invalidField, Problem } from "@/lib/problem";
import type { CommandContext } from "@/modules/audit";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { setOperatingLevelInput } from "../input";
import type { Measured } from "../model";
import { determinationsOf, getSystemById, openJoinsOf } from "../records";
import { BelowFloorError, operatingVolume } from "../rules/operating-volume";
import { recordAt } from "../rules/record-at";
import { readQuantity } from "../rules/typed-component";
import { join, operatingLevel } from "../schema";

/** Says how a system stands from now on: its level, whether it is drained, which systems it shares its water with. */
export const setOperatingLevel = defineCommand({
  verb: "setOperatingLevel",
  permission: systemsMay.setOperatingLevel,
  input: setOperatingLevelInput,
  areas: ({ db }, { systemId, joinedWith }) => {
    const partners = openJoinsOf(db, systemId).flatMap((each) => [each.oneSystemId, each.otherSystemId]);
    return [...new Set([systemId, ...joinedWith, ...partners])].map((id) => getSystemById(db, id).areaId);
  },
  run(ctx, { systemId, levelOffset, lengthUnit, isDrained, joinedWith, reason }) {
    const { db, actor, at } = ctx;
    mustBeInService(ctx, systemId, joinedWith);
    const levelOffsetM = readQuantity(levelOffset, lengthUnit, "m", "levelOffset");
    mustLieAboveFloor(ctx, systemId, { levelOffsetM, isDrained });
    const { id } = db
      .insert(operatingLevel)
      .values({
        systemId,
        levelOffsetM: levelOffsetM.value,
        levelOffsetUncertaintyM: levelOffsetM.standardUncertainty,
        isDrained,
        reason,
        setBy: actor.personId,
        setAt: at,
      })
      .returning({ id: operatingLevel.id })
      .get();
    joinExactly(ctx, systemId, joinedWith);
    return {
      result: { id },
      event: {
        kind: systemsEvents.operatingLevelSet,
        subject: { type: "system", id: systemId },
        payload: { levelOffsetM: levelOffsetM.value, isDrained, joinedWith },
        reason,
      },
    };
  },
});

function mustBeInService({ db }: CommandContext, systemId: number, joinedWith: readonly number[]): void {
  if (joinedWith.includes(systemId)) {
    throw invalidField("/joinedWith", "self", "A system cannot be joined with itself.");
  }
  for (const id of [systemId, ...joinedWith]) {
    const each = getSystemById(db, id);
    if (each.state === "retired")
      throw new Problem("conflict", `${each.code} is retired and holds no water.`);
  }
}

/** Refuses a level that would leave less than nothing; where the volume or the surface is unknown, the level is a fact all the same. */
function mustLieAboveFloor(
  { db, at }: CommandContext,
  systemId: number,
  level: { levelOffsetM: Measured; isDrained: boolean },
): void {
  const record = recordAt(determinationsOf(db, systemId), at);
  if (!record || record.surfaceAreaM2 === null) return;
  const volumeL = { value: record.volumeL, standardUncertainty: record.standardUncertaintyL };
  const surfaceM2 = {
    value: record.surfaceAreaM2,
    standardUncertainty: record.surfaceAreaUncertaintyM2 ?? 0,
  };
  try {
    operatingVolume(volumeL, surfaceM2, level);
  } catch (error) {
    if (error instanceof BelowFloorError)
      throw invalidField("/levelOffset/text", "below-floor", error.message);
    throw error;
  }
}

function joinExactly(
  { db, actor, at }: CommandContext,
  systemId: number,
  joinedWith: readonly number[],
): void {
  const wanted = new Set(joinedWith);
  for (const each of openJoinsOf(db, systemId)) {
    const partner = each.oneSystemId === systemId ? each.otherSystemId : each.oneSystemId;
    if (wanted.delete(partner)) continue;
    db.update(join).set({ endedAt: at, endedBy: actor.personId }).where(eq(join.id, each.id)).run();
  }
  for (const partner of wanted) {
    const [oneSystemId, otherSystemId] = [Math.min(systemId, partner), Math.max(systemId, partner)];
    db.insert(join).values({ oneSystemId, otherSystemId, joinedBy: actor.personId, joinedAt: at }).run();
  }
}
