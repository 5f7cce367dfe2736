import Link from "next/link";
import { Panel } from "@/lib/ui";

/** One thing that waits: where it is, what it is, and who is waited for. */
export interface WaitingItem {
  href: string;
  label: string;
  says: string;
}

/** Things that wait for somebody, each a link; the panel stays away where nothing waits. */
export function WaitingList({ title, items }: { title: string; items: readonly WaitingItem[] }) {
  if (items.length === 0) return null;
  return (
    <Panel title={title} aside={String(items.length)}>
      <ul className="divide-y divide-rule">
        {items.map((item) => (
          <li key={`${item.href} ${item.label}`} className="py-2.5 first:pt-0 last:pb-0">
            <Link href={item.href} className="link inline-flex min-h-6 font-semibold">
              {item.label}
            </Link>
            <p className="text-[0.9375rem] text-ink-2">{item.says}</p>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
