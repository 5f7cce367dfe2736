"use client";
import { useRef, useState } from "react";
import { ApiProblem, Button, FormError, NetworkProblem, Select, sendCommand } from "@/lib/ui";
import type { FacilityParameter, InstrumentRow, MethodRow } from "@/modules/methods/model";
import { PARAMETER_GROUP_WORDS, PARAMETER_GROUPS } from "@/modules/methods/model";
import type { PointRow } from "@/modules/systems/model";
import type { WatchPlanRow } from "../model";
import { type WatchDraft, WatchItemRow } from "./watch-item-row";

export interface WatchEditorProps {
  point: PointRow;
  items: readonly WatchPlanRow[];
  allPoints: readonly PointRow[];
  plan: readonly WatchPlanRow[];
  parameters: readonly FacilityParameter[];
  methods: readonly MethodRow[];
  instruments: readonly InstrumentRow[];
  onClose: () => void;
  onDone: (text: string) => void;
}

const toDraft = (item: WatchPlanRow): WatchDraft => ({
  parameterId: item.parameterId,
  everyDays: item.everyDays === null ? "" : String(item.everyDays),
  unit: item.unit ?? "",
  methodId: item.methodId,
  instrumentId: item.instrumentId,
});

const isDays = (text: string) => /^\s*\d{1,3}\s*$/.test(text) && Number(text) >= 1 && Number(text) <= 366;

/** Whether a draft can be sent: a number of days, or none. */
export function daysFault(draft: WatchDraft): string | null {
  if (draft.everyDays.trim() === "" || isDays(draft.everyDays)) return null;
  return "A whole number of days from 1 to 366; empty for whenever it is wanted.";
}

/** The list of one point while it is changed: order, how often, unit, method, instrument; sent as one. */
export function WatchEditor(props: WatchEditorProps) {
  const { point, items, allPoints, plan, parameters, onClose, onDone } = props;
  const [drafts, setDrafts] = useState(() => items.map(toDraft));
  const [problem, setProblem] = useState<ApiProblem | NetworkProblem | null>(null);
  const [busy, setBusy] = useState(false);
  const key = useRef("");
  const faulty = drafts.some((draft) => daysFault(draft) !== null);

  const send = async () => {
    if (faulty) return;
    key.current ||= crypto.randomUUID();
    setBusy(true);
    setProblem(null);
    try {
      const body = {
        items: drafts.map(({ everyDays, unit, ...rest }) => ({
          ...rest,
          everyDays: everyDays.trim() === "" ? null : Number(everyDays),
          unit: unit === "" ? null : unit,
        })),
      };
      await sendCommand(`/api/v1/points/${point.id}/watch`, body, {
        method: "PUT",
        idempotencyKey: key.current,
      });
      onDone(`What is read at ${point.systemCode} ${point.name} is changed.`);
    } catch (error) {
      if (!(error instanceof ApiProblem || error instanceof NetworkProblem)) throw error;
      if (error instanceof ApiProblem && error.status < 500) key.current = "";
      setProblem(error);
    } finally {
      setBusy(false);
    }
  };
  const move = (index: number, by: -1 | 1) => {
    const next = [...drafts];
    const [moved] = next.splice(index, 1);
    if (moved) next.splice(index + by, 0, moved);
    setDrafts(next);
  };
  const add = (added: readonly WatchDraft[]) =>
    setDrafts((before) => [
      ...before,
      ...added.filter((draft) => !before.some((each) => each.parameterId === draft.parameterId)),
    ]);
  const errorOf = (index: number) =>
    problem instanceof ApiProblem
      ? problem.errors.find((error) => error.pointer.startsWith(`/items/${index}/`))?.detail
      : undefined;
  return (
    <div className="grid gap-3">
      <FormError problem={problem} />
      <ol className="divide-y divide-rule">
        {drafts.map((draft, index) => (
          <WatchItemRow
            key={draft.parameterId}
            {...props}
            draft={draft}
            position={index}
            isLast={index === drafts.length - 1}
            error={daysFault(draft) ?? errorOf(index)}
            onMove={(by) => move(index, by)}
            onChange={(change) =>
              setDrafts(drafts.map((each, at) => (at === index ? { ...each, ...change } : each)))
            }
            onRemove={() => setDrafts(drafts.filter((_, at) => at !== index))}
          />
        ))}
      </ol>
      {drafts.length === 0 && (
        <p className="text-ink-2">Nothing yet. Add a parameter, or copy another point.</p>
      )}
      <AddRow
        point={point}
        drafts={drafts}
        parameters={parameters}
        allPoints={allPoints}
        plan={plan}
        onAdd={add}
      />
      <div className="flex flex-wrap gap-2.5">
        <Button variant="next" busy={busy} busyText="Sending" disabled={faulty} onClick={() => void send()}>
          Save the list
        </Button>
        <Button onClick={onClose}>Cancel</Button>
      </div>
    </div>
  );
}

type AddRowProps = Pick<WatchEditorProps, "point" | "parameters" | "allPoints" | "plan"> & {
  drafts: readonly WatchDraft[];
  onAdd: (added: readonly WatchDraft[]) => void;
};

function AddRow({ point, drafts, parameters, allPoints, plan, onAdd }: AddRowProps) {
  const free = parameters.filter(
    (each) => !each.isRetired && !drafts.some((draft) => draft.parameterId === each.id),
  );
  const groups = PARAMETER_GROUPS.map((group) => ({
    label: PARAMETER_GROUP_WORDS[group],
    options: free
      .filter((each) => each.group === group)
      .map((each) => ({ value: String(each.id), label: each.name })),
  })).filter((group) => group.options.length > 0);
  const sources = allPoints.filter(
    (each) => each.id !== point.id && plan.some((item) => item.pointId === each.id),
  );
  const usable = (item: WatchPlanRow) => free.some((each) => each.id === item.parameterId);
  return (
    <div className="grid gap-2.5 sm:grid-cols-2">
      <Select
        aria-label={`Add a parameter to ${point.name}`}
        placeholder="Add a parameter …"
        options={groups}
        value=""
        onChange={(event) => {
          const parameterId = Number(event.target.value);
          if (parameterId > 0)
            onAdd([{ parameterId, everyDays: "1", unit: "", methodId: null, instrumentId: null }]);
        }}
      />
      {sources.length > 0 && (
        <Select
          aria-label={`Copy to ${point.name} what is read at another point`}
          placeholder="Copy from another point …"
          options={sources.map((each) => ({
            value: String(each.id),
            label: `${each.systemCode} ${each.name}`,
          }))}
          value=""
          onChange={(event) =>
            onAdd(
              plan.filter((item) => String(item.pointId) === event.target.value && usable(item)).map(toDraft),
            )
          }
        />
      )}
    </div>
  );
}
