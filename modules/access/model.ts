/** The roles of a facility's people, by code. A facility may rename the labels, never the codes. */
export const ROLES = [
  "aquarist",
  "operator",
  "analyst",
  "lead",
  "veterinarian",
  "auditor",
  "admin",
  "reader",
] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_LABELS: Record<Role, string> = {
  aquarist: "aquarist",
  operator: "life-support operator",
  analyst: "laboratory analyst",
  lead: "water-quality lead",
  veterinarian: "veterinarian",
  auditor: "auditor",
  admin: "administrator",
  reader: "reader",
};

/** How far a permission reaches: the whole facility, or only the areas a person is bound to (all, where bound to none). */
export type Scope = "everywhere" | "own areas";

/** One thing that may be done, and by whom. `bounded` permissions are checked against the areas a command touches. */
export type Permission<Bounded extends boolean = boolean> = {
  readonly code: string;
  readonly says: string;
  readonly roles: Readonly<Partial<Record<Role, Scope>>>;
  readonly bounded: Bounded;
  /** Done by the product itself (a job), never by a person. */
  readonly bySystem: boolean;
};

/** Who acts. A person with the roles in force at this moment (deputies included), or the product itself. */
export type Actor = {
  readonly kind: "person" | "system";
  readonly personId: number | null;
  readonly name: string;
  readonly roles: readonly Role[];
  /** The areas the person is bound to; null where bound to none (all areas). */
  readonly areaIds: readonly number[] | null;
  readonly sessionId: string | null;
};

export const SYSTEM_ACTOR: Actor = {
  kind: "system",
  personId: null,
  name: "Stillwell",
  roles: [],
  areaIds: null,
  sessionId: null,
};
