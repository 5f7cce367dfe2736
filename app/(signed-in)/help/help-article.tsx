import Link from "next/link";
import type { readHelpPage } from "@/app/_server/handbook";
import { PageHead, Panel } from "@/lib/ui";

/** A page of Help: its contents, then its text. The HTML is made from files that ship with the product. */
export function HelpArticle({ page }: { page: NonNullable<ReturnType<typeof readHelpPage>> }) {
  return (
    <>
      <PageHead title={page.title} facts={<Link href="/help">All of Help</Link>} />
      <Panel>
        {page.headings.length > 1 && (
          <nav aria-label="On this page" className="mb-4 border-b border-rule pb-3">
            <ul className="flex flex-wrap gap-x-5 gap-y-1">
              {page.headings.map((heading) => (
                <li key={heading.id}>
                  <a href={`#${heading.id}`} className="link inline-block min-h-6">
                    {heading.text}
                  </a>
                </li>
              ))}
            </ul>
          </nav>
        )}
        <div className="prose help-prose" dangerouslySetInnerHTML={{ __html: page.html }} />
      </Panel>
    </>
  );
}
