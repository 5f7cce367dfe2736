import {
  addEquipment,
  addPoint,
  approveVolume,
  createArea,
  createSite,
  createSystem,
  proposeVolume,
  setOperatingLevel,
} from "@/modules/systems";
import { DAYS, type Stage } from "./stage";
import { AREAS, SYSTEMS, type SystemSeed } from "./systems.data";

const metres = (value: number, uncertainty: number) => ({
  text: String(value),
  uncertainty: String(uncertainty),
});

function tankComponent(tank: SystemSeed["tank"]) {
  if ("box" in tank) {
    const [lengthM, widthM, heightM] = tank.box;
    const dimensions = {
      lengthM: metres(lengthM, 0.02),
      widthM: metres(widthM, 0.02),
      heightM: metres(heightM, 0.01),
    };
    return { name: "Tank", shape: "box" as const, dimensions, isAtSurface: true };
  }
  const [diameterM, heightM] = tank.round;
  const dimensions = { diameterM: metres(diameterM, 0.03), heightM: metres(heightM, 0.01) };
  return { name: "Tank", shape: "upright-cylinder" as const, dimensions, isAtSurface: true };
}

function seedVolume(stage: Stage, system: SystemSeed, systemId: number, at: number): void {
  const pipes = {
    name: "Pipe runs",
    shape: "pipe-run" as const,
    dimensions: { innerDiameterM: metres(0.16, 0.002), lengthM: metres(18, 0.5) },
  };
  const { id } = stage.act("tomas", at, proposeVolume, {
    systemId,
    method: "geometry",
    components: [tankComponent(system.tank), pipes],
    note: "Measured with a steel tape and a level at the water line.",
    effectiveFromAt: at,
  });
  stage.act("ines", at + 3_600_000, approveVolume, { determinationId: id });
}

/** Areas, systems with points, equipment and an approved volume each. */
export function seedSystems(stage: Stage): void {
  const at = stage.moment(DAYS + 2, "09:00");
  stage.act("marek", at, createSite, { code: "CS", name: "Corran Sound Marine Station" });
  AREAS.forEach((area, order) => {
    const { id } = stage.act("marek", at, createArea, { ...area, walkingOrder: order + 1 });
    stage.areaIds.set(area.code, id);
  });
  SYSTEMS.forEach((system, order) => {
    const [first, ...others] = system.points;
    const { id, defaultPointId } = stage.act("marek", at + order * 60_000, createSystem, {
      code: system.code,
      name: system.name,
      areaId: stage.areaIds.get(system.area) ?? 0,
      kind: system.kind,
      waterType: "seawater",
      walkingOrder: order + 1,
      ...(first ? { defaultPoint: { code: first[0], name: first[1], kind: first[2] } } : {}),
    });
    stage.systemIds.set(system.code, id);
    stage.pointIds.set(system.code, defaultPointId);
    if (first) stage.pointIds.set(`${system.code}/${first[0]}`, defaultPointId);
    for (const [code, name, kind] of others) {
      const added = stage.act("marek", at + order * 60_000, addPoint, { systemId: id, code, name, kind });
      stage.pointIds.set(`${system.code}/${code}`, added.id);
    }
    for (const [code, name, kind] of system.equipment) {
      stage.act("marek", at + order * 60_000, addEquipment, { systemId: id, code, name, kind });
    }
    seedVolume(stage, system, id, at + 3_600_000 + order * 60_000);
  });
}

/** Later: a level that is low today, and a tracer test that waits for the lead and disagrees with the geometry. */
export function seedVolumeStory(stage: Stage): void {
  const systemId = stage.systemIds.get("KELP-01") ?? 0;
  const [lowered, traced] = [stage.moment(4, "15:20"), stage.moment(2, "16:40")];
  stage.plan(lowered, () => {
    stage.act("tomas", lowered, setOperatingLevel, {
      systemId,
      levelOffset: { text: "-12", uncertainty: "1" },
      lengthUnit: "cm",
      reason: "Lowered for work on the overflow weir.",
    });
  });
  stage.plan(traced, () => {
    stage.act("tomas", traced, proposeVolume, {
      systemId,
      method: "tracer",
      volume: { text: "291.4", uncertainty: "2.6" },
      volumeUnit: "m³",
      surfaceArea: { text: "71.7", uncertainty: "0.4" },
      note: "2.00 kg of sodium nitrate added, nitrate rose from 14.1 to 19.1 mg/L after two turnovers.",
    });
  });
}
