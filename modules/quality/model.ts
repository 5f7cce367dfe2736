import type { Qualifier, Side, Status } from "@/modules/measurements/model";

export const INCIDENT_STATES = ["open", "rechecked", "closed"] as const;
export type IncidentState = (typeof INCIDENT_STATES)[number];

export const INCIDENT_STATE_WORDS: Readonly<Record<IncidentState, string>> = {
  open: "open",
  rechecked: "rechecked, waits to be closed",
  closed: "closed",
};

/** Off by so much that it can be taken up as an incident. */
export function isOff(status: Status): boolean {
  return status === "out" || status === "implausible";
}

/** One incident in a list. */
export interface IncidentRow {
  readonly id: number;
  readonly code: string;
  readonly title: string;
  readonly state: IncidentState;
  readonly areaId: number;
  readonly areaName: string;
  readonly systemId: number;
  readonly systemCode: string;
  readonly systemName: string;
  readonly pointId: number | null;
  readonly pointName: string | null;
  readonly parameterId: number | null;
  readonly parameterName: string | null;
  readonly ownerId: number;
  readonly beganAt: number;
  readonly openedAt: number;
  readonly openedBy: number;
  readonly recheckDueAt: number | null;
  readonly closedAt: number | null;
  readonly readings: number;
}

/** A reading that was joined to an incident, as it stands now. */
export interface IncidentReading {
  readonly readingId: number;
  readonly joinedBy: number;
  readonly joinedAt: number;
  readonly pointName: string;
  readonly parameterId: number;
  readonly typedText: string;
  readonly typedUnit: string | null;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly takenAt: number;
  readonly takenBy: number;
  readonly status: Status;
  readonly side: Side | null;
  readonly sentence: string;
  /** "corrected": a later value stands in its place; "struck out": it counts no more. */
  readonly standing: "in force" | "corrected" | "struck out";
}
