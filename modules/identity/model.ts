import type { Role } from "@/modules/access/model";

export const PERSON_STATES = ["invited", "active", "suspended"] as const;
export type PersonState = (typeof PERSON_STATES)[number];

export const GRANT_STATES = ["waiting", "active", "refused", "ended"] as const;
export type GrantState = (typeof GRANT_STATES)[number];

export const LINK_PURPOSES = ["invitation", "reset"] as const;
export type LinkPurpose = (typeof LINK_PURPOSES)[number];

/** A person as lists show them. */
export type PersonRow = {
  id: number;
  name: string;
  email: string;
  state: PersonState;
  suspendedReason: string | null;
  roles: Role[];
  waitingRoles: { grantId: number; role: Role; grantedBy: number | null }[];
  areaIds: number[];
};

export const PASSWORD_MIN_LENGTH = 12;
export const PASSWORD_MAX_LENGTH = 200;
