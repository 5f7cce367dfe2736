import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { readHelpPage } from "@/app/_server/handbook";
import { pageActor } from "@/app/_server/session";
import { HelpArticle } from "@/app/(signed-in)/help/help-article";

type Props = { params: Promise<{ page: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: readHelpPage("handbook", (await params).page)?.title ?? "Help" };
}

export default async function HelpPage({ params }: Props) {
  await pageActor();
  const page = readHelpPage("handbook", (await params).page);
  if (page === null) notFound();
  return <HelpArticle page={page} />;
}
