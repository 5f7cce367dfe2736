import { type Permission, ROLES, type Role, type Scope } from "./model";

type RoleGrants = Partial<Record<Role, Scope>>;
type PermissionRow = { says: string; roles: RoleGrants | "everyone" | "system" };

type IsBounded<Row extends PermissionRow> = Row["roles"] extends "everyone" | "system"
  ? false
  : "own areas" extends Row["roles"][keyof Row["roles"]]
    ? true
    : false;

/** Every role, everywhere: for what anybody who is signed in may do or see. */
const EVERY_ROLE: RoleGrants = Object.fromEntries(ROLES.map((role) => [role, "everywhere"]));

/**
 * A module's permissions as one readable table: `definePermissions("measurements", { record: { says, roles: { aquarist:
 * "own areas", lead: "everywhere" } } })` gives `measurements.record`. A role that is not named has no permission.
 */
export function definePermissions<const Table extends Record<string, PermissionRow>>(
  module: string,
  table: Table,
): { readonly [Name in keyof Table]: Permission<IsBounded<Table[Name]>> } {
  const entries = Object.entries(table).map(([name, row]) => {
    const roles = row.roles === "everyone" ? EVERY_ROLE : row.roles === "system" ? {} : row.roles;
    const permission: Permission = {
      code: `${module}.${name}`,
      says: row.says,
      roles,
      bounded: Object.values(roles).includes("own areas"),
      bySystem: row.roles === "system",
    };
    return [name, permission];
  });
  return Object.fromEntries(entries) as {
    readonly [Name in keyof Table]: Permission<IsBounded<Table[Name]>>;
  };
}

/** Every role, an aquarist in their own areas: for what tells of the water of an area. */
export const EVERY_ROLE_AQUARIST_IN_OWN_AREAS = {
  aquarist: "own areas",
  operator: "everywhere",
  analyst: "everywhere",
  lead: "everywhere",
  veterinarian: "everywhere",
  auditor: "everywhere",
  admin: "everywhere",
  reader: "everywhere",
} as const satisfies RoleGrants;
