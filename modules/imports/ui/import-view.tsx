"use client";
import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useEffect } from "react";
import {
  Facts,
  fetchJson,
  LinkButton,
  Notice,
  PageHead,
  Panel,
  Progress,
  type StatusCode,
  StatusWord,
  TimeText,
} from "@/lib/ui";
import { IMPORT_STATE_WORDS, type ImportDetail, WORKING_STATES } from "../model";
import { ColumnMapPanel } from "./column-map";
import { ImportActs, type MayDo } from "./import-acts";
import { STATE_SENTENCES } from "./import-words";
import { PreviewTable } from "./preview-table";
import { QuestionsForm } from "./questions-form";

const LOOK_AGAIN_MS = 1000;
const number = (value: number) => value.toLocaleString("en-GB");
const STATUSES: readonly StatusCode[] = ["within", "watch", "out", "implausible", "unjudged", "none"];
const CHECKED_STATES = ["checked", "committing", "committed", "withdrawn"];

/** What the server says about an import, asked again every second while it works on it. */
function useImport(initial: ImportDetail): ImportDetail {
  const router = useRouter();
  const isWorking = WORKING_STATES.includes(initial.state);
  const { data } = useQuery({
    queryKey: ["import", initial.id, initial.state],
    queryFn: ({ signal }) => fetchJson<{ data: ImportDetail }>(`/api/v1/imports/${initial.id}`, signal),
    enabled: isWorking,
    refetchInterval: LOOK_AGAIN_MS,
    staleTime: 0,
  });
  const latest = isWorking && data ? data.data : initial;
  useEffect(() => {
    if (latest.state !== initial.state) router.refresh();
  }, [latest.state, initial.state, router]);
  return latest;
}

export type ImportViewProps = { detail: ImportDetail; zone: string; mayDo: MayDo };

/** An import from its questions to its result. */
export function ImportView({ detail: initial, zone, mayDo }: ImportViewProps) {
  const detail = useImport(initial);
  const isChecked = CHECKED_STATES.includes(detail.state) && detail.acceptedCount !== null;
  return (
    <>
      <PageHead
        title={detail.code}
        name={<span className="break-all">{detail.fileName}</span>}
        facts={STATE_SENTENCES[detail.state]}
        figures={<ImportFacts detail={detail} zone={zone} />}
      />
      <div className="grid gap-5">
        <div role="status" className="empty:hidden">
          <Working detail={detail} />
        </div>
        {detail.state === "failed" && detail.problem && (
          <Notice kind="stop" title="The import could not go on">
            <p>{detail.problem}</p>
          </Notice>
        )}
        {detail.state === "withdrawn" && (
          <Notice title={`Withdrawn by ${detail.withdrawnByName ?? "somebody"}`}>
            <p>{detail.withdrawnReason}</p>
          </Notice>
        )}
        {detail.state === "questions" && mayDo.upload && (
          <Panel title="How is the file to be read?">
            <QuestionsForm detail={detail} />
          </Panel>
        )}
        {isChecked && <Result detail={detail} mayDo={mayDo} />}
        {!isChecked && <ImportActs detail={detail} mayDo={mayDo} />}
        {isChecked && (
          <Panel title="Readings of the file">
            <PreviewTable key={`${detail.id} ${detail.checkedAt}`} detail={detail} />
          </Panel>
        )}
        <Panel title="How the file is understood">
          <ColumnMapPanel detail={detail} mayAnswer={mayDo.upload} />
        </Panel>
      </div>
    </>
  );
}

function ImportFacts({ detail, zone }: { detail: ImportDetail; zone: string }) {
  return (
    <Facts
      facts={[
        { label: "State", value: IMPORT_STATE_WORDS[detail.state] },
        {
          label: "Uploaded",
          value: <TimeText at={detail.uploadedAt} zone={zone} />,
          note: detail.uploadedByName,
        },
        ...(detail.committedAt === null
          ? []
          : [
              {
                label: "Committed",
                value: <TimeText at={detail.committedAt} zone={zone} />,
                note: detail.committedByName ?? undefined,
              },
            ]),
        {
          label: "File",
          value: (
            <a className="link" href={`/api/v1/imports/${detail.id}/original`} download>
              as it came
            </a>
          ),
          note: (
            <span title={`SHA-256 ${detail.sha256}`} className="num">
              {detail.sha256.slice(0, 12)}…
            </span>
          ),
        },
      ]}
    />
  );
}

function Working({ detail }: { detail: ImportDetail }) {
  const { state, progress } = detail;
  if (state === "uploaded" || state === "checking") {
    const rows = progress?.rowsRead ?? 0;
    const label = state === "uploaded" ? "Looking through the file" : "Checking the rows";
    const noun = rows > 0 ? `% (${number(rows)} rows)` : "%";
    return <Progress label={label} done={Math.floor(100 * (progress?.share ?? 0))} total={100} noun={noun} />;
  }
  if (state !== "committing") return null;
  const total = progress?.accepted ?? detail.acceptedCount ?? 0;
  return (
    <Progress
      label="Bringing in the readings"
      done={progress?.committed ?? 0}
      total={total}
      noun="readings"
    />
  );
}

/** What the check came to, what is to be expected, and what can be done now. */
function Result({ detail, mayDo }: { detail: ImportDetail; mayDo: MayDo }) {
  const counts = detail.statusCounts;
  const off = counts ? counts.out + counts.implausible : 0;
  const isOver = detail.state === "committed" || detail.state === "withdrawn";
  const refused = detail.refusedCount ?? 0;
  return (
    <Panel
      title={isOver ? "What came of it" : "What was found"}
      actions={
        refused > 0 ? (
          <LinkButton href={`/api/v1/imports/${detail.id}/rejects`} prefetch={false} size="small" download>
            Download the refused
          </LinkButton>
        ) : undefined
      }
    >
      <div className="grid gap-5">
        <div className="flex flex-wrap gap-x-14 gap-y-5">
          <Facts
            facts={[
              { label: "Accepted", value: <span className="num">{number(detail.acceptedCount ?? 0)}</span> },
              {
                label: "Duplicate",
                value: <span className="num">{number(detail.duplicateCount ?? 0)}</span>,
                note: "left out",
              },
              {
                label: "Refused",
                value: <span className="num">{number(refused)}</span>,
                note: refused > 0 ? "mend and import the list again" : undefined,
              },
            ]}
          />
          {counts && <StatusFacts counts={counts} />}
        </div>
        {detail.state === "checked" && off > 0 && (
          <Notice
            kind="caution"
            title={`${number(off)} ${off === 1 ? "reading is" : "readings are"} out of tolerance or implausible`}
          >
            <p>By committing you confirm that they say what was read. Look at them below first.</p>
          </Notice>
        )}
        {detail.state === "checked" && (detail.acceptedCount ?? 0) === 0 && (
          <Notice title="There is nothing to commit">
            <p>
              No reading of the file is new and readable. Mend what was refused and upload the mended file, or{" "}
              <Link className="link" href="/imports">
                choose another one
              </Link>
              .
            </p>
          </Notice>
        )}
        <ImportActs detail={detail} mayDo={mayDo} />
      </div>
    </Panel>
  );
}

function StatusFacts({ counts }: { counts: NonNullable<ImportDetail["statusCounts"]> }) {
  const shown = STATUSES.filter((status) => counts[status] > 0);
  if (shown.length === 0) return null;
  return (
    <Facts
      facts={shown.map((status) => ({
        label: <StatusWord status={status} />,
        value: <span className="num">{number(counts[status])}</span>,
      }))}
    />
  );
}
