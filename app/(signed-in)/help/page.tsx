import type { Metadata } from "next";
import Link from "next/link";
import { type HelpPage, helpPages, type Shelf } from "@/app/_server/handbook";
import { pageActor } from "@/app/_server/session";
import { Button, Notice, PageHead, Panel, TextInput } from "@/lib/ui";

export const metadata: Metadata = { title: "Help" };

const SHELVES: readonly { shelf: Shelf; title: string; at: string }[] = [
  { shelf: "handbook", title: "Handbook", at: "/help" },
  { shelf: "formulas", title: "Formulas and their sources", at: "/help/formulas" },
];

const fits = (page: HelpPage, words: string): boolean =>
  words
    .toLowerCase()
    .split(/\s+/)
    .every((word) => page.title.toLowerCase().includes(word));

export default async function HelpContents({
  searchParams,
}: {
  searchParams: Promise<{ title?: string | string[] }>;
}) {
  await pageActor();
  const { title } = await searchParams;
  const words = typeof title === "string" ? title.trim().slice(0, 80) : "";
  const shelves = SHELVES.map((one) => ({
    ...one,
    pages: helpPages(one.shelf).filter((page) => fits(page, words)),
  }));
  const found = shelves.filter(({ pages }) => pages.length > 0);
  return (
    <>
      <PageHead
        title="Help"
        facts="How each day is done here, what the words mean, and how values are computed."
      />
      <div className="mb-5">
        <Notice kind="caution" title="Stillwell is not a life-safety alarm">
          A computed value is a proposal: a person checks, decides and signs. Your facility&rsquo;s
          procedures, local codes and licensed practice come first.
        </Notice>
      </div>
      <form
        action="/help"
        method="get"
        role="search"
        aria-label="Search Help by title"
        className="mb-5 flex flex-wrap gap-2.5"
      >
        <label className="grid grow gap-1 font-semibold sm:max-w-sm">
          Words of the title
          <TextInput name="title" defaultValue={words} maxLength={80} autoComplete="off" />
        </label>
        <Button type="submit" className="self-end">
          Search
        </Button>
      </form>
      {found.length === 0 && (
        <p>
          No page has “{words}” in its title. <Link href="/help">Show every page</Link>
        </p>
      )}
      <div className="grid items-start gap-5 lg:grid-cols-2">
        {found.map(({ shelf, title: heading, at, pages }) => (
          <Panel key={shelf} title={heading}>
            <ul className="divide-y divide-rule">
              {pages.map((page) => (
                <li key={page.slug} className="py-2.5 first:pt-0 last:pb-0">
                  <Link href={`${at}/${page.slug}`} className="link inline-block min-h-6">
                    {page.title}
                  </Link>
                </li>
              ))}
            </ul>
          </Panel>
        ))}
      </div>
    </>
  );
}
