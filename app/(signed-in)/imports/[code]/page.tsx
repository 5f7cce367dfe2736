import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { may } from "@/modules/access";
import { getImport, importsMay } from "@/modules/imports";
import { ImportView } from "@/modules/imports/ui/import-view";

type Props = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Import ${(await params).code}` };
}

export default async function ImportPage({ params }: Props) {
  const { code } = await params;
  const detail = await askPage(getImport, { code });
  const actor = await pageActor();
  return (
    <ImportView
      detail={detail}
      zone={settings().STILLWELL_ZONE}
      mayDo={{ upload: may(actor, importsMay.upload), withdraw: may(actor, importsMay.withdraw) }}
    />
  );
}
