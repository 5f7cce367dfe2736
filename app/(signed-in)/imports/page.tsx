import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { EmptyState, PageHead, Pager, Panel } from "@/lib/ui";
import { may } from "@/modules/access";
import { importsMay, listImports } from "@/modules/imports";
import { ColumnsGuide } from "@/modules/imports/ui/columns-guide";
import { ImportTable } from "@/modules/imports/ui/import-table";
import { UploadBox } from "@/modules/imports/ui/upload-box";

export const metadata: Metadata = { title: "Imports" };

type Props = { searchParams: Promise<{ before?: string }> };

export default async function ImportsPage({ searchParams }: Props) {
  const { before } = await searchParams;
  const { rows, next } = await askPage(listImports, before === undefined ? {} : { before });
  const mayUpload = may(await pageActor(), importsMay.upload);
  const { IMPORT_MAX_MB, STILLWELL_ZONE } = settings();
  return (
    <>
      <PageHead
        title="Imports"
        facts="Readings of instruments and spreadsheets, brought in as files: checked first, committed as one, withdrawn as one."
      />
      <div className="grid gap-5">
        {mayUpload && (
          <Panel title="Bring in a file">
            <UploadBox maxMb={IMPORT_MAX_MB} />
          </Panel>
        )}
        <Panel title="Files so far">
          {rows.length === 0 ? (
            <EmptyState title="No imports yet">
              <p>
                Each file stands here with what became of its readings. An analyst, an operator or a lead
                brings them in; a committed import can be withdrawn whole, with a reason.
              </p>
            </EmptyState>
          ) : (
            <ImportTable rows={rows} zone={STILLWELL_ZONE} />
          )}
          <Pager
            newerHref={before === undefined ? null : "/imports"}
            newerText="Newest"
            olderHref={next === null ? null : `/imports?before=${next}`}
          />
        </Panel>
        {mayUpload && (
          <Panel
            title="What is understood"
            actions={
              <a className="link" href="/api/v1/imports/template" download>
                Template to fill in (CSV)
              </a>
            }
          >
            <ColumnsGuide />
          </Panel>
        )}
      </div>
    </>
  );
}
