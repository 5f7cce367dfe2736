export { abilityFor, may, mayInArea, visibleAreas, type WaterAbility } from "./ability";
export {
  type Actor,
  type Permission,
  ROLE_LABELS,
  ROLES,
  type Role,
  type Scope,
  SYSTEM_ACTOR,
} from "./model";
export { definePermissions, EVERY_ROLE_AQUARIST_IN_OWN_AREAS } from "./permissions";
