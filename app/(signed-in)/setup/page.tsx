import type { Metadata } from "next";
import Link from "next/link";
import { pageActor } from "@/app/_server/session";
import { PageHead, Panel } from "@/lib/ui";
import { may } from "@/modules/access";
import { SETUP } from "./sections.data";

export const metadata: Metadata = { title: "Setup" };

export default async function SetupPage() {
  const actor = await pageActor();
  const groups = SETUP.map((group) => ({
    ...group,
    sections: group.sections.filter((section) => section.for.some((one) => may(actor, one))),
  })).filter((group) => group.sections.length > 0);
  return (
    <>
      <PageHead title="Setup" facts="What your roles let you see and change about the facility." />
      <div className="grid items-start gap-5 lg:grid-cols-2">
        {groups.map((group) => (
          <Panel key={group.title} title={group.title}>
            <ul className="divide-y divide-rule">
              {group.sections.map((section) => (
                <li key={section.href} className="py-3 first:pt-0 last:pb-0">
                  <Link href={section.href} className="link inline-flex min-h-6 font-semibold">
                    {section.label}
                  </Link>
                  <p className="text-ink-2">{section.says}</p>
                </li>
              ))}
            </ul>
          </Panel>
        ))}
      </div>
    </>
  );
}
