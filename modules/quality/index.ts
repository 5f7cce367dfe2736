import "server-only";

export { qualityMay } from "./abilities";
export { closeIncident } from "./commands/close-incident";
export { joinReading } from "./commands/join-reading";
export { openIncident } from "./commands/open-incident";
export { recordRecheck } from "./commands/record-recheck";
export { addIncidentNote, setOwner, setRecheck } from "./commands/work-on-incident";
export { qualityEvents } from "./events";
export { getIncident, type IncidentShown } from "./queries/get-incident";
export { type IncidentOfReading, incidentOfReading } from "./queries/incident-of-reading";
export { findOpenIncident, listIncidents } from "./queries/list-incidents";
