import type { z } from "zod";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { proposeVolumeInput } from "../input";
import type { GeometrySnapshot } from "../model";
import { getSystemById } from "../records";
import { totalVolume } from "../rules/total-volume";
import { readComponent, readQuantity } from "../rules/typed-component";
import { volumeDetermination } from "../schema";

type Proposal = z.output<typeof proposeVolumeInput>;

/** Proposes a volume from geometry or a tracer test; it counts once another person has approved it. */
export const proposeVolume = defineCommand({
  verb: "proposeVolume",
  permission: systemsMay.proposeVolume,
  input: proposeVolumeInput,
  areas: ({ db }, { systemId }) => [getSystemById(db, systemId).areaId],
  run({ db, actor, at }, input) {
    invariant(actor.personId !== null, "a volume is proposed by a person");
    const owner = getSystemById(db, input.systemId);
    if (owner.state === "retired")
      throw new Problem("conflict", `${owner.code} is retired; its volume stays as it is.`);
    const figures = figuresOf(input);
    const { id } = db
      .insert(volumeDetermination)
      .values({
        ...figures,
        systemId: input.systemId,
        method: input.method,
        note: input.note,
        status: "proposed",
        proposedBy: actor.personId,
        proposedAt: at,
        effectiveFromAt: input.effectiveFromAt ?? at,
      })
      .returning({ id: volumeDetermination.id })
      .get();
    const { volumeL, standardUncertaintyL } = figures;
    return {
      result: { id, volumeL, standardUncertaintyL },
      event: {
        kind: systemsEvents.volumeProposed,
        subject: { type: "volume", id },
        payload: { systemId: input.systemId, method: input.method, volumeL, standardUncertaintyL },
      },
    };
  },
});

function figuresOf(input: Proposal) {
  if (input.method === "tracer") {
    const volume = readQuantity(input.volume, input.volumeUnit, "L", "volume");
    const surface = input.surfaceArea && readQuantity(input.surfaceArea, "m", "m", "surfaceArea");
    return {
      volumeL: volume.value,
      standardUncertaintyL: volume.standardUncertainty,
      surfaceAreaM2: surface?.value ?? null,
      surfaceAreaUncertaintyM2: surface?.standardUncertainty ?? null,
      components: null,
    };
  }
  const total = totalVolume(input.components.map(readComponent), input.correlation);
  const snapshot: GeometrySnapshot = { typed: input.components, computed: total.components };
  return {
    volumeL: total.volumeL,
    standardUncertaintyL: total.standardUncertaintyL,
    surfaceAreaM2: total.surfaceAreaM2 > 0 ? total.surfaceAreaM2 : null,
    surfaceAreaUncertaintyM2: null,
    correlation: input.correlation,
    components: JSON.stringify(snapshot),
  };
}
