import type { ReactNode } from "react";
import { Button, ButtonRow, DateInput, LinkButton, Select, type SelectGroup, TextInput } from "@/lib/ui";

/** What the search boxes hold, as they stand in the address. */
export type HistorySearch = {
  person?: string;
  verb?: string;
  subject?: string;
  key?: string;
  from?: string;
  to?: string;
};

export interface HistoryFiltersProps {
  search: HistorySearch;
  people: readonly { id: number; name: string }[];
  /** Actions in words, grouped by part of the product. */
  actions: readonly SelectGroup[];
  subjects: readonly { value: string; label: string }[];
}

const Labelled = ({ label, children }: { label: string; children: ReactNode }) => (
  <label className="grid min-w-0 content-start gap-1 text-[0.9375rem] font-semibold">
    {label}
    {children}
  </label>
);

/** Searches the history by an address that can be kept and passed on. */
export function HistoryFilters({ search, people, actions, subjects }: HistoryFiltersProps) {
  const persons = [
    ...people.map(({ id, name }) => ({ value: String(id), label: name })),
    { value: "system", label: "Stillwell itself" },
  ];
  return (
    <form
      action="/history"
      method="get"
      role="search"
      aria-label="Search the history"
      className="mb-4 grid gap-3"
    >
      <div className="grid gap-3 sm:grid-cols-2 xl:grid-cols-6">
        <Labelled label="Person">
          <Select
            name="person"
            defaultValue={search.person ?? ""}
            placeholder="Everybody"
            options={persons}
          />
        </Labelled>
        <Labelled label="Action">
          <Select name="verb" defaultValue={search.verb ?? ""} placeholder="Every action" options={actions} />
        </Labelled>
        <Labelled label="About">
          <Select
            name="subject"
            defaultValue={search.subject ?? ""}
            placeholder="Everything"
            options={subjects}
          />
        </Labelled>
        <Labelled label="Its number">
          <TextInput name="key" defaultValue={search.key ?? ""} autoComplete="off" maxLength={80} />
        </Labelled>
        <Labelled label="From day">
          <DateInput name="from" defaultValue={search.from ?? ""} />
        </Labelled>
        <Labelled label="To day">
          <DateInput name="to" defaultValue={search.to ?? ""} />
        </Labelled>
      </div>
      <ButtonRow>
        <Button type="submit">Search</Button>
        <LinkButton href="/history" variant="quiet">
          Show everything
        </LinkButton>
      </ButtonRow>
    </form>
  );
}
