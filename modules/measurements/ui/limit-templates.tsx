"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import {
  ApiProblem,
  Button,
  EmptyState,
  Field,
  FormError,
  Notice,
  PageHead,
  Panel,
  Select,
  sendCommand,
  TextInput,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { epochToLocal } from "@/lib/zone";
import type { FacilityParameter } from "@/modules/methods/model";
import { limitTemplateFormInput } from "../input";
import type { LimitTemplateRow } from "../model";
import { draftOf } from "./limit-draft";
import { LimitSheet } from "./limit-sheet";
import { shapeLines } from "./limit-words";
import { refusedRows } from "./refused-rows";
import { sheetKey, useLimitSheet } from "./use-limit-sheet";

export interface LimitTemplatesProps {
  templates: LimitTemplateRow[];
  /** Measured parameters in use. */
  parameters: FacilityParameter[];
  zone: string;
  mayPropose: boolean;
}

/** Setup: limits by parameter under a name. Laid on systems, they are a proposal like any other. */
export function LimitTemplates({ templates, parameters, zone, mayPropose }: LimitTemplatesProps) {
  const [open, setOpen] = useState<LimitTemplateRow | "new" | null>(null);
  const begin = mayPropose && open === null && (
    <Button variant="next" onClick={() => setOpen("new")}>
      New template
    </Button>
  );
  return (
    <>
      <PageHead
        title="Templates of limits"
        facts="A template changes nothing by itself: laid on systems it becomes a proposal."
        actions={templates.length > 0 && begin}
      />
      <div className="grid gap-5">
        {open !== null && (
          <TemplateEditor
            key={open === "new" ? "new" : open.id}
            template={open === "new" ? null : open}
            parameters={parameters}
            zone={zone}
            onClose={() => setOpen(null)}
          />
        )}
        {templates.length === 0 && open === null && (
          <EmptyState title="No templates yet" actions={begin}>
            Keep here what many systems share: the limits of a tropical reef, of a cold quarantine. When a
            system is new or a season turns, lay the template on as many systems as you like at once.
          </EmptyState>
        )}
        {templates.map((template) => (
          <Panel
            key={template.id}
            title={template.name}
            actions={
              mayPropose &&
              open === null && (
                <Button size="small" aria-label={`Edit ${template.name}`} onClick={() => setOpen(template)}>
                  Edit
                </Button>
              )
            }
          >
            {template.note !== "" && <p className="mb-2 text-ink-2">{template.note}</p>}
            <dl className="grid gap-x-4 gap-y-1 sm:grid-cols-[auto_1fr]">
              {template.rows.map(({ parameterId, shape }) => {
                const parameter = parameters.find((each) => each.id === parameterId);
                return (
                  <div key={parameterId} className="contents">
                    <dt className="font-semibold">{parameter?.name ?? "a retired parameter"}</dt>
                    <dd className="max-sm:mb-1.5">
                      {shapeLines(shape, parameter?.decimals ?? 1, zone).map((line) => (
                        <span key={line.when} className="block">
                          {line.when !== null && `${line.when}: `}
                          {line.words}
                        </span>
                      ))}
                    </dd>
                  </div>
                );
              })}
            </dl>
          </Panel>
        ))}
      </div>
    </>
  );
}

type TemplateEditorProps = Pick<LimitTemplatesProps, "parameters" | "zone"> & {
  template: LimitTemplateRow | null;
  onClose: () => void;
};

const NO_SUSPENSION = ["constant", "ramp", "season"] as const;

function TemplateEditor({ template, parameters, zone, onClose }: TemplateEditorProps) {
  const router = useRouter();
  const say = useLiveMessage();
  const [start] = useState(() =>
    (template?.rows ?? []).flatMap(({ parameterId, shape }) => {
      const parameter = parameters.find((each) => each.id === parameterId);
      const draft = draftOf(shape, (at) => epochToLocal(at, zone).on);
      return parameter
        ? [{ key: sheetKey(null, parameterId), pointId: null, parameter, draft, initial: draft }]
        : [];
    }),
  );
  const { rows, change, remove, lay } = useLimitSheet(start, zone);
  const [trouble, setTrouble] = useState<string | null>(null);
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: limitTemplateFormInput,
    defaultValues: { name: template?.name ?? "", note: template?.note ?? "" },
    send: async (values, idempotencyKey) => {
      const good = rows.flatMap(({ parameter, read }) =>
        read.ok ? [{ parameterId: parameter.id, shape: read.shape }] : [],
      );
      const isWhole = good.length === rows.length && rows.length > 0;
      setTrouble(isWhole ? null : "Give every row its limits in order, and at least one row.");
      if (!isWhole) return;
      const body = { ...values, templateId: template?.id ?? null, rows: good };
      await sendCommand("/api/v1/limits/templates", body, { idempotencyKey });
      say({ text: `The template ${values.name} is kept.` });
      onClose();
      router.refresh();
    },
  });
  const missing = parameters.filter((each) => !rows.some((row) => row.parameter.id === each.id));
  return (
    <form onSubmit={submit} noValidate>
      <Panel title={template ? `Template ${template.name}` : "New template"}>
        <div className="grid gap-4">
          <FormError problem={problem} labels={{ name: "Name", note: "Note" }} />
          <div className="grid gap-4 sm:grid-cols-2">
            <Field label="Name" name="name" required error={errorOf("name")}>
              <TextInput {...form.register("name")} />
            </Field>
            <Field label="Note" name="note" error={errorOf("note")}>
              <TextInput {...form.register("note")} />
            </Field>
          </div>
          <LimitSheet
            rows={rows}
            kinds={NO_SUSPENSION}
            showAll={trouble !== null}
            refused={refusedRows(
              problem instanceof ApiProblem ? problem.errors : [],
              rows.map((row) => row.key),
            )}
            nameOf={(row) => row.parameter.name}
            titleOf={(row) => row.parameter.name}
            onChange={change}
            onRemove={remove}
          />
          <Field label="Add a parameter" className="max-w-sm">
            <Select
              placeholder="Choose a parameter"
              value=""
              options={missing.map((each) => ({ value: String(each.id), label: each.name }))}
              onChange={(event) => {
                const parameter = missing.find((each) => String(each.id) === event.target.value);
                if (parameter) lay([{ pointId: null, parameter }]);
              }}
            />
          </Field>
          {trouble !== null && (
            <div role="alert">
              <Notice kind="stop" title="Not kept">
                {trouble}
              </Notice>
            </div>
          )}
          <div className="flex flex-wrap gap-2.5">
            <Button variant="next" type="submit" busy={sending} busyText="Sending">
              Keep the template
            </Button>
            <Button onClick={onClose}>Cancel</Button>
          </div>
        </div>
      </Panel>
    </form>
  );
}
