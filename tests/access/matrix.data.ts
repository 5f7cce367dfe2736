import type { RecordKind } from "./records";

/** The roles of the facility, as PRODUCT names them. Written here a second time on purpose: the matrix asks nothing of the code. */
export const MATRIX_ROLES = [
  "aquarist",
  "operator",
  "analyst",
  "lead",
  "veterinarian",
  "auditor",
  "admin",
  "reader",
] as const;
export type MatrixRole = (typeof MATRIX_ROLES)[number];

/**
 * Who is let in. "anybody": also without signing in. "signed in": whoever is, even one whose last role has ended. A list:
 * these roles alone.
 */
export type LetIn = "anybody" | "signed in" | readonly MatrixRole[];

export type MatrixRow = {
  may: LetIn;
  /** What fills the dynamic parts of the address whose name does not say it by itself. */
  parts?: Readonly<Record<string, RecordKind>>;
  /** Search parameters, filled like parts. */
  search?: Readonly<Record<string, RecordKind>>;
  /** The answer to those let in, where it is not the usual one (pages and reads 200, writes 422). */
  letIn?: number;
  /** The answer to an aquarist about a record of another area, where the address names one (404 unless said). */
  elsewhere?: 200 | 403 | 404;
  /** The answer about a record that does not exist, where the address names one (404 unless said). */
  missing?: 200 | 404;
  /** What is sent: JSON unless said. */
  sends?: "a file";
};

export type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";

// Whose work is what, from the table "The people" of PRODUCT.
const EVERYONE = MATRIX_ROLES;
/** Administrators: people, roles, areas, parameters, mail, tokens, backups. */
const ADMIN = ["admin"] as const;
/** Leads approve limits, volumes and days, and close incidents. */
const LEAD = ["lead"] as const;
const SET_UP_WATER = ["lead", "admin"] as const;
const SET_UP_METHODS = ["analyst", "lead", "admin"] as const;
const SET_UP_EQUIPMENT = ["operator", "lead", "admin"] as const;
/** Those who stand at the water; the auditor changes nothing, the reader looks, the administrator cannot judge water. */
const TAKE_READINGS = ["aquarist", "operator", "analyst", "lead", "veterinarian"] as const;
const CORRECT_READINGS = ["aquarist", "operator", "analyst", "lead"] as const;
const HANDLE_INCIDENTS = TAKE_READINGS;
const PROPOSE_LIMITS = ["analyst", "lead", "veterinarian"] as const;
const PROPOSE_VOLUMES = ["aquarist", "operator", "analyst", "lead"] as const;
const SET_LEVELS = ["aquarist", "operator", "lead"] as const;
const CHECK_INSTRUMENTS = ["aquarist", "operator", "analyst", "lead"] as const;
/** The auditor reads everything; the administrator keeps the place; the lead answers for the water. */
const READ_PEOPLE = ["lead", "auditor", "admin"] as const;
const READ_HISTORY = ["lead", "auditor", "admin"] as const;
const READ_HEALTH = ["auditor", "admin"] as const;
const READ_MAIL = ["auditor", "admin"] as const;
const VERIFY = ["auditor", "admin"] as const;
const SEE_IMPORTS = ["operator", "analyst", "lead", "veterinarian", "auditor", "admin"] as const;
const IMPORT = ["operator", "analyst", "lead"] as const;
const WITHDRAW_IMPORTS = ["analyst", "lead"] as const;

/** Every page. */
export const PAGES: Readonly<Record<string, MatrixRow>> = {
  "/": { may: "signed in", letIn: 307 },
  "/sign-in": { may: "anybody" },
  "/reset": { may: "anybody" },
  "/reset/[token]": { may: "anybody", missing: 200 },
  "/invitation/[token]": { may: "anybody", missing: 200 },
  "/account": { may: EVERYONE },
  "/today": { may: EVERYONE },
  "/rounds": { may: EVERYONE },
  "/rounds/grid": { may: TAKE_READINGS },
  "/rounds/[areaCode]/[day]": { may: EVERYONE },
  "/systems": { may: EVERYONE },
  "/systems/[code]": { may: EVERYONE, parts: { code: "systemCode" } },
  "/systems/[code]/entry": { may: TAKE_READINGS, parts: { code: "systemCode" } },
  "/systems/[code]/volume": { may: EVERYONE, parts: { code: "systemCode" } },
  "/systems/[code]/charts": { may: EVERYONE, parts: { code: "systemCode" } },
  "/systems/[code]/charts/[parameter]": { may: EVERYONE, parts: { code: "systemCode" } },
  "/charts": { may: EVERYONE },
  "/readings/[readingId]": { may: EVERYONE },
  "/imports": { may: SEE_IMPORTS },
  "/imports/[code]": { may: SEE_IMPORTS, parts: { code: "importCode" } },
  "/incidents": { may: EVERYONE },
  "/incidents/open": { may: HANDLE_INCIDENTS },
  "/incidents/[incidentId]": { may: EVERYONE },
  "/review": { may: EVERYONE },
  "/history": { may: READ_HISTORY },
  "/history/[entryId]": { may: READ_HISTORY },
  "/history/verification": { may: VERIFY },
  "/history/record/[table]/[key]": { may: EVERYONE },
  "/help": { may: "signed in" },
  "/help/[page]": { may: "signed in", parts: { page: "helpPage" } },
  "/help/formulas/[page]": { may: "signed in", parts: { page: "formulaPage" } },
  "/setup": { may: "signed in" },
  "/setup/areas": { may: EVERYONE },
  "/setup/systems": { may: EVERYONE },
  "/setup/systems/[code]": { may: EVERYONE, parts: { code: "systemCode" } },
  "/setup/watch": { may: EVERYONE },
  "/setup/parameters": { may: EVERYONE },
  "/setup/methods": { may: EVERYONE },
  "/setup/instruments": { may: EVERYONE },
  "/setup/instruments/[code]": { may: EVERYONE, parts: { code: "instrumentCode" } },
  "/setup/limits": { may: EVERYONE },
  "/setup/limits/change": { may: PROPOSE_LIMITS },
  "/setup/limits/templates": { may: EVERYONE },
  "/setup/limits/workbooks": { may: EVERYONE },
  "/setup/limits/workbooks/[workbookId]": { may: EVERYONE },
  "/setup/people": { may: READ_PEOPLE },
  "/setup/people/invite": { may: ADMIN },
  "/setup/people/[personId]": { may: READ_PEOPLE },
  "/setup/roles": { may: EVERYONE },
  "/setup/deputies": { may: READ_PEOPLE },
  "/setup/outbox": { may: READ_MAIL },
  "/setup/health": { may: READ_HEALTH },
};

/** Every route of the interface, method by method. */
export const ROUTES: Readonly<Record<string, Readonly<Partial<Record<Method, MatrixRow>>>>> = {
  // next-auth's own door; what it lets through is tested in sessions.test.ts.
  "/api/auth/[...nextauth]": {
    GET: { may: "anybody", parts: { nextauth: "authSession" }, missing: 200 },
    POST: { may: "anybody", parts: { nextauth: "authUnknown" }, letIn: 400, missing: 200 },
  },
  "/api/v1/session": { GET: { may: "signed in" } },
  "/api/v1/account": { GET: { may: EVERYONE } },
  "/api/v1/account/password": { POST: { may: EVERYONE } },
  "/api/v1/account/units": { PUT: { may: EVERYONE } },
  "/api/v1/password/reset": { POST: { may: "anybody" } },
  "/api/v1/password/set": { POST: { may: "anybody" } },

  "/api/v1/people": { GET: { may: READ_PEOPLE }, POST: { may: ADMIN } },
  "/api/v1/people/names": { GET: { may: EVERYONE } },
  "/api/v1/people/[personId]": { GET: { may: READ_PEOPLE }, PATCH: { may: ADMIN } },
  "/api/v1/people/[personId]/areas": { PUT: { may: ADMIN } },
  "/api/v1/people/[personId]/invitation": { POST: { may: ADMIN } },
  "/api/v1/people/[personId]/suspension": { POST: { may: ADMIN } },
  "/api/v1/people/[personId]/reinstatement": { POST: { may: ADMIN } },
  "/api/v1/people/[personId]/roles": { POST: { may: ADMIN } },
  "/api/v1/people/[personId]/roles/end": { POST: { may: ADMIN } },
  "/api/v1/roles/[grantId]/decision": { POST: { may: ADMIN } },
  "/api/v1/deputies": { GET: { may: READ_PEOPLE }, POST: { may: SET_UP_WATER } },
  "/api/v1/deputies/[deputyshipId]/end": { POST: { may: SET_UP_WATER } },
  "/api/v1/mail": { GET: { may: READ_MAIL } },

  "/api/v1/sites": { GET: { may: EVERYONE }, POST: { may: ADMIN } },
  "/api/v1/areas": { GET: { may: EVERYONE }, POST: { may: ADMIN } },
  "/api/v1/areas/[areaId]": { PUT: { may: ADMIN } },
  "/api/v1/systems": { GET: { may: EVERYONE }, POST: { may: SET_UP_WATER } },
  "/api/v1/systems/[systemId]": { PUT: { may: SET_UP_WATER } },
  "/api/v1/systems/[systemId]/retire": { POST: { may: SET_UP_WATER } },
  "/api/v1/systems/by-code/[code]": { GET: { may: EVERYONE, parts: { code: "systemCode" } } },
  "/api/v1/points": { GET: { may: EVERYONE }, POST: { may: SET_UP_WATER } },
  "/api/v1/points/[pointId]": { PUT: { may: SET_UP_WATER } },
  "/api/v1/points/[pointId]/watch": { PUT: { may: SET_UP_WATER } },
  "/api/v1/equipment": { GET: { may: EVERYONE }, POST: { may: SET_UP_EQUIPMENT } },
  "/api/v1/equipment/[equipmentId]": { PUT: { may: SET_UP_EQUIPMENT } },
  "/api/v1/operating-levels": { POST: { may: SET_LEVELS } },
  "/api/v1/volumes": {
    GET: { may: EVERYONE, search: { code: "systemCode" } },
    POST: { may: PROPOSE_VOLUMES },
  },
  "/api/v1/volumes/waiting": { GET: { may: EVERYONE } },
  "/api/v1/volumes/[determinationId]/approve": { POST: { may: LEAD } },
  "/api/v1/volumes/[determinationId]/decline": { POST: { may: LEAD } },

  "/api/v1/parameters": { GET: { may: EVERYONE }, POST: { may: SET_UP_WATER } },
  "/api/v1/parameters/catalogue": { GET: { may: SET_UP_WATER }, POST: { may: SET_UP_WATER } },
  "/api/v1/parameters/[parameterId]": { PUT: { may: SET_UP_WATER } },
  "/api/v1/parameters/[parameterId]/retirement": { POST: { may: SET_UP_WATER } },
  "/api/v1/methods": { GET: { may: EVERYONE }, POST: { may: SET_UP_METHODS } },
  "/api/v1/methods/[methodId]": { PUT: { may: SET_UP_METHODS } },
  "/api/v1/instruments": { GET: { may: EVERYONE }, POST: { may: SET_UP_METHODS } },
  "/api/v1/instruments/by-code/[code]": { GET: { may: EVERYONE, parts: { code: "instrumentCode" } } },
  "/api/v1/instruments/[instrumentId]": { PUT: { may: SET_UP_METHODS } },
  "/api/v1/instruments/[instrumentId]/checks": { POST: { may: CHECK_INSTRUMENTS } },

  "/api/v1/limits": {
    GET: { may: EVERYONE, search: { systemId: "systemId" }, elsewhere: 200, missing: 200 },
  },
  "/api/v1/limits/templates": { GET: { may: EVERYONE }, POST: { may: PROPOSE_LIMITS } },
  "/api/v1/limits/workbooks": { GET: { may: EVERYONE }, POST: { may: PROPOSE_LIMITS } },
  "/api/v1/limits/workbooks/[workbookId]": { GET: { may: EVERYONE } },
  "/api/v1/limits/workbooks/[workbookId]/decision": { POST: { may: LEAD } },
  "/api/v1/watch": { GET: { may: EVERYONE, search: { areaId: "areaId" }, elsewhere: 200, missing: 200 } },

  "/api/v1/readings": {
    GET: { may: EVERYONE, search: { areaId: "areaId" }, elsewhere: 200, missing: 200 },
    POST: { may: TAKE_READINGS },
  },
  "/api/v1/readings/[readingId]": { GET: { may: EVERYONE } },
  "/api/v1/readings/[readingId]/incident": { GET: { may: EVERYONE } },
  "/api/v1/readings/[readingId]/confirmation": { POST: { may: TAKE_READINGS } },
  "/api/v1/readings/[readingId]/correction": { POST: { may: CORRECT_READINGS } },
  "/api/v1/readings/[readingId]/explanation": { POST: { may: TAKE_READINGS } },
  "/api/v1/readings/[readingId]/void": { POST: { may: CORRECT_READINGS } },
  "/api/v1/series": { GET: { may: EVERYONE, search: { pointId: "pointId", parameterId: "parameterId" } } },
  "/api/v1/series/csv": {
    GET: { may: EVERYONE, search: { pointId: "pointId", parameterId: "parameterId" } },
  },
  "/api/v1/day-sheets": { GET: { may: EVERYONE, search: { days: "day" } } },
  "/api/v1/day-sheets/[areaId]/[onDay]": { GET: { may: EVERYONE } },
  "/api/v1/reviews": { POST: { may: LEAD } },

  "/api/v1/incidents": {
    GET: { may: EVERYONE, search: { systemId: "systemId" }, elsewhere: 200, missing: 200 },
    POST: { may: HANDLE_INCIDENTS },
  },
  "/api/v1/incidents/about": {
    GET: {
      may: EVERYONE,
      search: { pointId: "pointId", parameterId: "parameterId" },
      elsewhere: 200,
      missing: 200,
    },
  },
  "/api/v1/incidents/[incidentId]": { GET: { may: EVERYONE } },
  "/api/v1/incidents/[incidentId]/notes": { POST: { may: HANDLE_INCIDENTS } },
  "/api/v1/incidents/[incidentId]/owner": { POST: { may: HANDLE_INCIDENTS } },
  "/api/v1/incidents/[incidentId]/readings": { POST: { may: HANDLE_INCIDENTS } },
  "/api/v1/incidents/[incidentId]/recheck": { POST: { may: HANDLE_INCIDENTS } },
  "/api/v1/incidents/[incidentId]/recheck-due": { POST: { may: HANDLE_INCIDENTS } },
  "/api/v1/incidents/[incidentId]/closure": { POST: { may: LEAD } },

  "/api/v1/imports": { GET: { may: SEE_IMPORTS }, POST: { may: IMPORT, sends: "a file" } },
  "/api/v1/imports/template": { GET: { may: IMPORT } },
  "/api/v1/imports/[importId]": { GET: { may: SEE_IMPORTS } },
  "/api/v1/imports/[importId]/rows": { GET: { may: SEE_IMPORTS } },
  "/api/v1/imports/[importId]/rejects": { GET: { may: SEE_IMPORTS } },
  "/api/v1/imports/[importId]/original": { GET: { may: SEE_IMPORTS } },
  "/api/v1/imports/[importId]/answers": { POST: { may: IMPORT } },
  "/api/v1/imports/[importId]/check": { POST: { may: IMPORT } },
  "/api/v1/imports/[importId]/commit": { POST: { may: IMPORT } },
  "/api/v1/imports/[importId]/discard": { POST: { may: IMPORT } },
  "/api/v1/imports/[importId]/withdrawal": { POST: { may: WITHDRAW_IMPORTS } },

  "/api/v1/history": { GET: { may: READ_HISTORY } },
  "/api/v1/history/csv": { GET: { may: READ_HISTORY } },
  "/api/v1/history/[entryId]": { GET: { may: READ_HISTORY } },
  "/api/v1/history/record": { GET: { may: EVERYONE, search: { table: "table", key: "key" } } },
  "/api/v1/history/record/at": {
    GET: { may: EVERYONE, search: { table: "table", key: "key", at: "moment" } },
  },
  "/api/v1/history/verification": { GET: { may: VERIFY }, POST: { may: VERIFY } },
  "/api/v1/backups": { GET: { may: READ_HEALTH }, POST: { may: ADMIN } },
  "/api/v1/jobs/[jobId]/retry": { POST: { may: ADMIN } },
};
