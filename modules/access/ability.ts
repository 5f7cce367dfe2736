import { AbilityBuilder, createMongoAbility, type MongoAbility, subject } from "@casl/ability";
import type { Actor, Permission } from "./model";

/** CASL's action is a permission's code; its subject is water in an area. */
export type WaterAbility = MongoAbility<[string, "water" | (object & { areaId?: number })]>;

/** What a person may do, from the permissions' tables. The server decides with it; the client hides what can't be done. */
export function abilityFor(actor: Actor, permissions: readonly Permission[]): WaterAbility {
  const { can, build } = new AbilityBuilder<WaterAbility>(createMongoAbility);
  for (const permission of permissions) {
    if (actor.kind === "system") {
      if (permission.bySystem) can(permission.code, "water");
      continue;
    }
    for (const role of actor.roles) {
      const scope = permission.roles[role];
      if (scope === undefined) continue;
      if (scope === "everywhere" || actor.areaIds === null) can(permission.code, "water");
      else can(permission.code, "water", { areaId: { $in: [...actor.areaIds] } } as never);
    }
  }
  return build();
}

/** Whether the actor may do this at all (in some area). */
export function may(actor: Actor, permission: Permission): boolean {
  return abilityFor(actor, [permission]).can(permission.code, "water");
}

/** Whether the actor may do this in one area. */
export function mayInArea(actor: Actor, permission: Permission, areaId: number): boolean {
  return abilityFor(actor, [permission]).can(permission.code, subject("water", { areaId }) as never);
}

/** The areas a query shows: null means all. A person without the permission sees none. */
export function visibleAreas(actor: Actor, permission: Permission): readonly number[] | null {
  if (actor.kind === "system") return permission.bySystem ? null : [];
  const scopes = actor.roles.map((role) => permission.roles[role]);
  if (scopes.includes("everywhere")) return null;
  if (scopes.includes("own areas")) return actor.areaIds;
  return [];
}
