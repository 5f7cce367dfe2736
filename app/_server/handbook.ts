import "server-only";
import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { Marked, type Tokens } from "marked";

/** Where pages of Help lie: written by us, shipped with the product. */
const SHELVES = { handbook: "docs/handbook", formulas: "docs/formulas" } as const;
export type Shelf = keyof typeof SHELVES;

export type HelpPage = { slug: string; title: string };
export type HelpHeading = { id: string; text: string };

const folderOf = (shelf: Shelf): string => path.resolve(/* turbopackIgnore: true */ SHELVES[shelf]);
const SLUG = /^[a-z0-9-]+$/;

function titleOf(file: string): string {
  const [, title] = /^# (.+)$/m.exec(readFileSync(file, "utf8")) ?? [];
  return title ?? path.basename(file, ".md");
}

/** The pages of a shelf in their order (the number before a file's name is left out of its address). */
export function helpPages(shelf: Shelf): HelpPage[] {
  const folder = folderOf(shelf);
  return readdirSync(folder)
    .filter((name) => name.endsWith(".md"))
    .toSorted()
    .map((name) => ({
      slug: name.replace(/^\d+-/, "").replace(/\.md$/, ""),
      title: titleOf(path.join(folder, name)),
    }));
}

function fileOf(shelf: Shelf, slug: string): string | null {
  if (!SLUG.test(slug)) return null;
  const name = readdirSync(folderOf(shelf)).find((one) => one.replace(/^\d+-/, "") === `${slug}.md`);
  const file = name === undefined ? null : path.join(folderOf(shelf), name);
  return file !== null && existsSync(file) ? file : null;
}

const escapeHtml = (text: string): string =>
  text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;").replaceAll('"', "&quot;");

const idOf = (text: string): string =>
  text
    .toLowerCase()
    .replaceAll(/[^\p{Letter}\p{Number}]+/gu, "-")
    .replaceAll(/^-|-$/g, "");

/** A renderer that writes no HTML of the source's own, wraps tables for small screens, and links headings. */
function renderer(headings: HelpHeading[]): Marked {
  return new Marked({
    gfm: true,
    renderer: {
      html: ({ text }: Tokens.HTML | Tokens.Tag) => escapeHtml(text),
      heading({ tokens, depth, text }: Tokens.Heading) {
        if (depth === 1) return "";
        const id = idOf(text);
        if (depth === 2) headings.push({ id, text });
        const words = this.parser.parseInline(tokens);
        return `<h${depth} id="${id}"><a href="#${id}" class="help-anchor">${words}</a></h${depth}>\n`;
      },
      table(token: Tokens.Table) {
        const row = (cells: Tokens.TableCell[], tag: string) =>
          `<tr>${cells.map((cell) => `<${tag}>${this.parser.parseInline(cell.tokens)}</${tag}>`).join("")}</tr>`;
        const body = token.rows.map((cells) => row(cells, "td")).join("");
        return (
          `<div class="table-scroll" tabindex="0" role="region" aria-label="Table"><table class="data-table">` +
          `<thead>${row(token.header, 'th scope="col"').replaceAll('</th scope="col">', "</th>")}</thead>` +
          `<tbody>${body}</tbody></table></div>\n`
        );
      },
      link({ href, tokens }: Tokens.Link) {
        const words = this.parser.parseInline(tokens);
        return /^(https:\/\/|\/|#)/.test(href) ? `<a href="${escapeHtml(href)}">${words}</a>` : words;
      },
      image: ({ text }: Tokens.Image) => escapeHtml(text),
    },
  });
}

/** A page of Help as HTML, its title and its headings; null where there is none. */
export function readHelpPage(
  shelf: Shelf,
  slug: string,
): { title: string; html: string; headings: HelpHeading[] } | null {
  const file = fileOf(shelf, slug);
  if (file === null) return null;
  const headings: HelpHeading[] = [];
  const html = renderer(headings).parse(readFileSync(file, "utf8"), { async: false });
  return { title: titleOf(file), html, headings };
}
