import type { ReactNode } from "react";

export interface PageHeadProps {
  title: ReactNode;
  /** Beside the title, in plain text: the full name of what the code stands for. */
  name?: ReactNode;
  /** One line under the title: the facts that identify the thing. */
  facts?: ReactNode;
  /** In the middle on a desk: a few figures (see Facts). */
  figures?: ReactNode;
  /** What waits for this person here; drawn as the one tinted note of a page. */
  waiting?: ReactNode;
  actions?: ReactNode;
}

/** The head of a page: what this is, the facts about it, and what waits for you. */
export function PageHead({ title, name, facts, figures, waiting, actions }: PageHeadProps) {
  return (
    <div className="flex flex-wrap items-start gap-x-10 gap-y-4 pt-6 pb-5">
      <div className="min-w-0 grow basis-80">
        <h1>
          {title}
          {name !== undefined && (
            <small className="ml-2.5 font-sans text-base font-normal tracking-normal text-ink-2 max-sm:mt-1.5 max-sm:ml-0 max-sm:block">
              {name}
            </small>
          )}
        </h1>
        {facts !== undefined && <p className="mt-2 text-ink-2">{facts}</p>}
      </div>
      {figures}
      {actions !== undefined && <div className="flex flex-wrap gap-2.5">{actions}</div>}
      {waiting !== undefined && (
        <div className="grow border-l-4 border-water bg-wash px-4 py-2.5 text-[0.9375rem] sm:max-w-xs sm:grow-0">
          <b className="block font-semibold">Waiting for you</b>
          {waiting}
        </div>
      )}
    </div>
  );
}

export interface Fact {
  label: ReactNode;
  value: ReactNode;
  /** A quiet addition: uncertainty, source, date. */
  note?: ReactNode;
}

/** A short list of named figures, aligned. */
export function Facts({ facts }: { facts: readonly Fact[] }) {
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-3.5 gap-y-1 text-[0.9375rem]">
      {facts.map((fact, index) => (
        <div key={index} className="contents">
          <dt className="text-ink-3">{fact.label}</dt>
          <dd className="font-semibold">
            {fact.value}
            {fact.note !== undefined && (
              <span className="ml-2 text-sm font-normal text-ink-3">{fact.note}</span>
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}
