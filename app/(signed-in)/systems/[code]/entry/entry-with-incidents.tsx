"use client";
import { EntrySheet, type EntrySheetProps } from "@/modules/measurements/ui/entry-sheet";
import { IncidentLink } from "@/modules/quality/ui/incident-link";

/** The entry sheet, with the way to take up or join an incident beside each reading that is off. */
export function EntryWithIncidents(props: Omit<EntrySheetProps, "renderIncidentLink">) {
  return <EntrySheet {...props} renderIncidentLink={(readingId) => <IncidentLink readingId={readingId} />} />;
}
