import "server-only";
import { auditEvents } from "@/modules/audit";
import type { EventKind } from "@/modules/audit/model";
import { identityEvents } from "@/modules/identity";
import { importsEvents } from "@/modules/imports";
import { measurementsEvents } from "@/modules/measurements";
import { methodsEvents } from "@/modules/methods";
import { qualityEvents } from "@/modules/quality";
import { roundsEvents } from "@/modules/rounds";
import { systemsEvents } from "@/modules/systems";

/** Every module's history verbs under the words that people know the module by. A module with events stands here
 * (tests/architecture/history.test.ts sees to it). */
export const EVENT_TABLES: readonly { title: string; events: Readonly<Record<string, EventKind>> }[] = [
  { title: "Readings and limits", events: measurementsEvents },
  { title: "Rounds and the review of the day", events: roundsEvents },
  { title: "Imports", events: importsEvents },
  { title: "Incidents", events: qualityEvents },
  { title: "Areas and systems", events: systemsEvents },
  { title: "Parameters, methods and instruments", events: methodsEvents },
  { title: "People and accounts", events: identityEvents },
  { title: "The history itself", events: auditEvents },
];

/** Verb → what it says: "reading.corrected" → "corrected a reading". */
export const SAID_OF_VERB: Readonly<Record<string, string>> = Object.fromEntries(
  EVENT_TABLES.flatMap(({ events }) => Object.values(events).map(({ verb, says }) => [verb, says])),
);

/** What somebody did, in words; a verb that no module knows any more stands for itself. */
export const saidOf = (verb: string): string => SAID_OF_VERB[verb] ?? verb;
