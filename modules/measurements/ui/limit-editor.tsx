"use client";
import { useRouter } from "next/navigation";
import { useMemo, useState } from "react";
import {
  ApiProblem,
  Button,
  DateInput,
  Field,
  FormError,
  LinkButton,
  Notice,
  PageHead,
  Panel,
  sendCommand,
  TextInput,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { epochToLocal } from "@/lib/zone";
import type { FacilityParameter } from "@/modules/methods/model";
import type { PointRow } from "@/modules/systems/model";
import { limitWorkbookFormInput } from "../input";
import type { LimitBoardRow, LimitTemplateRow } from "../model";
import { DRAFT_KINDS, draftOf, draftOfVersion, momentOf } from "./limit-draft";
import { LimitSheet } from "./limit-sheet";
import { LimitSheetAdd } from "./limit-sheet-add";
import { refusedRows } from "./refused-rows";
import { type ReadRow, sheetKey, useLimitSheet } from "./use-limit-sheet";

export interface LimitEditorProps {
  /** The system whose limits the sheet begins with; null begins empty. */
  systemCode: string | null;
  points: PointRow[];
  /** Measured parameters in use. */
  parameters: FacilityParameter[];
  board: LimitBoardRow[];
  templates: LimitTemplateRow[];
  zone: string;
  now: number;
}

const LABELS = { title: "Title", reason: "Reason", from: "Hold from", to: "Until" };

/** A workbook of limits: rows of point and parameter, proposed in one act for another person to approve. */
export function LimitEditor({
  systemCode,
  points,
  parameters,
  board,
  templates,
  zone,
  now,
}: LimitEditorProps) {
  const router = useRouter();
  const say = useLiveMessage();
  const dayOf = (at: number) => epochToLocal(at, zone).on;
  const inForce = useMemo(() => {
    const entries = board.map((row) => {
      const { limits } = row;
      const version =
        limits.state === "none" ? null : (row.versions.find((each) => each.id === limits.versionId) ?? null);
      return [
        sheetKey(row.pointId, row.parameterId),
        draftOfVersion(version, (at) => epochToLocal(at, zone).on),
      ] as const;
    });
    return new Map(entries);
  }, [board, zone]);
  const [start] = useState(() =>
    board
      .filter((row) => row.systemCode === systemCode)
      .flatMap((row) => {
        const parameter = parameters.find((each) => each.id === row.parameterId);
        const key = sheetKey(row.pointId, row.parameterId);
        const draft = inForce.get(key);
        return parameter && draft ? [{ key, pointId: row.pointId, parameter, draft, initial: draft }] : [];
      }),
  );
  const { rows, change, remove, lay } = useLimitSheet(start, zone);
  const [sent, setSent] = useState<readonly string[]>([]);
  const [trouble, setTrouble] = useState<string | null>(null);
  const changed = rows.filter((row) => row.isChanged);

  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: limitWorkbookFormInput,
    defaultValues: { title: "", reason: "", from: localText(now, zone), to: "" },
    send: async ({ title, reason, from, to }, idempotencyKey) => {
      const fault = sheetFault(changed);
      setTrouble(fault);
      if (fault !== null) return;
      const span = {
        effectiveFromAt: momentOf(from, zone),
        effectiveToAt: to === "" ? null : momentOf(to, zone),
      };
      setSent(changed.map((row) => row.key));
      const body = { title, reason, rows: changed.flatMap((row) => toSend(row, span)) };
      const answer = await sendCommand<{ data: { workbookId: number } }>("/api/v1/limits/workbooks", body, {
        idempotencyKey,
      });
      say({ text: "The limits are proposed. They hold once another person has approved them." });
      router.push(`/setup/limits/workbooks/${answer.data.workbookId}`);
    },
  });
  const placeOf = (row: ReadRow) => {
    const point = points.find((each) => each.id === row.pointId);
    return point ? `${point.systemCode} ${point.name}` : "";
  };
  const parameterOf = (id: number) => parameters.find((each) => each.id === id);
  return (
    <form onSubmit={submit} noValidate>
      <PageHead
        title="Change limits"
        facts="Everything changed on this sheet is proposed as one workbook, and another person approves it in one act."
      />
      <div className="grid gap-5">
        <FormError problem={problem} labels={LABELS} />
        <Panel title="The change">
          <div className="grid gap-4 sm:grid-cols-2">
            <Field label="Title" name="title" required error={errorOf("title")}>
              <TextInput {...form.register("title")} />
            </Field>
            <Field label="Reason" name="reason" required error={errorOf("reason")}>
              <TextInput {...form.register("reason")} />
            </Field>
            <Field
              label="Hold from"
              name="from"
              required
              error={errorOf("from")}
              hint={`Facility time (${zone}). Readings taken since then are judged again.`}
            >
              <DateInput kind="datetime-local" {...form.register("from")} />
            </Field>
            <Field
              label="Until"
              name="to"
              error={errorOf("to")}
              hint="Empty: until other limits are approved."
            >
              <DateInput kind="datetime-local" {...form.register("to")} />
            </Field>
          </div>
        </Panel>
        <Panel title="Limits" aside="an empty cell is an open side">
          {rows.length === 0 ? (
            <p className="text-ink-2">No rows yet. Add them below.</p>
          ) : (
            <LimitSheet
              rows={rows}
              kinds={DRAFT_KINDS}
              showAll={false}
              refused={refusedRows(problem instanceof ApiProblem ? problem.errors : [], sent)}
              nameOf={(row) => `${row.parameter.name}, ${placeOf(row)}`}
              titleOf={(row) => (
                <>
                  <span className="block text-sm font-normal text-ink-3">{placeOf(row)}</span>
                  {row.parameter.name}
                </>
              )}
              onChange={change}
              onRemove={remove}
            />
          )}
        </Panel>
        <LimitSheetAdd
          points={points}
          parameters={parameters}
          templates={templates}
          onAdd={(pointIds, parameterId) => {
            const parameter = parameterOf(parameterId);
            if (!parameter) return;
            lay(
              pointIds.map((pointId) => ({
                pointId,
                parameter,
                initial: inForce.get(sheetKey(pointId, parameterId)),
              })),
            );
          }}
          onLay={(pointIds, template) =>
            lay(
              pointIds.flatMap((pointId) =>
                template.rows.flatMap(({ parameterId, shape }) => {
                  const parameter = parameterOf(parameterId);
                  const initial = inForce.get(sheetKey(pointId, parameterId));
                  return parameter ? [{ pointId, parameter, initial, draft: draftOf(shape, dayOf) }] : [];
                }),
              ),
            )
          }
        />
        {trouble !== null && (
          <div role="alert">
            <Notice kind="stop" title="Not sent">
              {trouble}
            </Notice>
          </div>
        )}
        <div className="flex flex-wrap items-center gap-2.5">
          <Button variant="next" type="submit" busy={sending} busyText="Sending">
            {proposeWords(changed.length)}
          </Button>
          <LinkButton href={systemCode === null ? "/setup/limits" : `/setup/limits?system=${systemCode}`}>
            Cancel
          </LinkButton>
          <span className="text-ink-2">Rows that are left as they are are not sent.</span>
        </div>
      </div>
    </form>
  );
}

function proposeWords(count: number): string {
  if (count === 0) return "Propose the changes";
  return count === 1 ? "Propose 1 change" : `Propose ${count} changes`;
}

function localText(at: number, zone: string): string {
  const local = epochToLocal(at, zone);
  return `${local.on}T${local.at.slice(0, 5)}`;
}

/** Why the sheet cannot be sent as it is; null when it can. */
function sheetFault(changed: readonly ReadRow[]): string | null {
  if (changed.length === 0) return "Nothing is changed yet. Change at least one row.";
  const wrong = changed.filter((row) => !row.read.ok).length;
  if (wrong === 0) return null;
  return `${wrong === 1 ? "One row is" : `${wrong} rows are`} not in order. Mend what stands under ${wrong === 1 ? "it" : "them"}, then propose again.`;
}

function toSend(row: ReadRow, span: { effectiveFromAt: number | null; effectiveToAt: number | null }) {
  if (!row.read.ok) return [];
  const { shape, suspendedReason } = row.read;
  return [{ pointId: row.pointId, parameterId: row.parameter.id, ...span, shape, suspendedReason }];
}
