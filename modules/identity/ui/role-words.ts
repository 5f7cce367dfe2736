import { ROLE_LABELS, ROLES, type Role } from "@/modules/access";

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** A role as a heading or an option: "Water-quality lead". */
export const roleText = (role: Role): string => capital(ROLE_LABELS[role]);

export const ROLE_OPTIONS = ROLES.map((role) => ({ value: role, label: roleText(role) }));

export const STATE_WORDS = {
  invited: "invited, has not come in yet",
  active: "active",
  suspended: "suspended",
} as const;
