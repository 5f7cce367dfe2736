"use client";
import { type ReactNode, useRef } from "react";
import { EmptyState, LinkButton, PageHead } from "@/lib/ui";
import type { WatchRow } from "../model";
import { EntryList } from "./entry-list";
import { SendState } from "./send-state";
import { type PersonName, TakenFields, useTaken } from "./taken-fields";
import { useEntry } from "./use-entry";

export interface EntrySheetProps {
  system: { readonly code: string; readonly name: string };
  /** One line under the head: volume and the like. */
  facts?: ReactNode;
  rows: readonly WatchRow[];
  people: readonly PersonName[];
  personId: number;
  zone: string;
  now: number;
  /** The next system in walking order. */
  nextCode: string | null;
  renderIncidentLink?: (readingId: number) => ReactNode;
}

/** Readings typed in at one system: for wet hands, one thing under the other. */
export function EntrySheet(props: EntrySheetProps) {
  const { system, facts, rows, people, personId, zone, now, nextCode, renderIncidentLink } = props;
  const taken = useTaken(zone);
  const entry = useEntry(personId, taken.taken);
  const foot = useRef<HTMLDivElement>(null);
  const next = nextCode === null ? `/systems/${system.code}` : `/systems/${nextCode}/entry`;
  return (
    <div className="mx-auto max-w-4xl">
      <PageHead
        title={system.code}
        name={system.name}
        facts={facts}
        figures={
          <SendState state={entry.state} waiting={entry.waiting} zone={zone} onRetry={entry.outbox.retry} />
        }
      />
      {rows.length === 0 ? (
        <EmptyState title="Nothing is read here yet">
          <p>
            A lead says under Setup what is read at each point of a system, how often, and with which
            instrument.
          </p>
        </EmptyState>
      ) : (
        <>
          <div className="pb-4">
            <TakenFields taken={taken} people={people} personId={personId} />
          </div>
          <EntryList
            rows={rows}
            entry={entry}
            now={now}
            zone={zone}
            onEnd={() => foot.current?.querySelector("a")?.focus()}
            {...(renderIncidentLink ? { renderIncidentLink } : {})}
          />
        </>
      )}
      <div ref={foot} className="flex flex-wrap justify-end gap-2.5 py-6">
        <LinkButton href={next} variant="next" size="large" className="max-sm:w-full">
          {nextCode === null ? `Back to ${system.code}` : `On to ${nextCode} →`}
        </LinkButton>
      </div>
    </div>
  );
}
