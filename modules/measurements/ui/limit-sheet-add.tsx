"use client";
import { useState } from "react";
import { Button, Checkbox, Field, Panel, Select } from "@/lib/ui";
import type { FacilityParameter } from "@/modules/methods/model";
import type { PointRow } from "@/modules/systems/model";
import type { LimitTemplateRow } from "../model";

export interface LimitSheetAddProps {
  points: readonly PointRow[];
  parameters: readonly FacilityParameter[];
  templates: readonly LimitTemplateRow[];
  onAdd: (pointIds: readonly number[], parameterId: number) => void;
  onLay: (pointIds: readonly number[], template: LimitTemplateRow) => void;
}

/** More rows for the sheet: one parameter, or a whole template, at one or many systems at once. */
export function LimitSheetAdd({ points, parameters, templates, onAdd, onLay }: LimitSheetAddProps) {
  const [picked, setPicked] = useState<ReadonlySet<number>>(new Set());
  const [parameterId, setParameterId] = useState("");
  const [templateId, setTemplateId] = useState("");
  const toggle = (pointId: number, on: boolean) => {
    const next = new Set(picked);
    if (on) next.add(pointId);
    else next.delete(pointId);
    setPicked(next);
  };
  const template = templates.find((each) => String(each.id) === templateId);
  const nothing = picked.size === 0;
  return (
    <Panel title="More rows" aside="one parameter or a template, at many systems at once">
      <fieldset>
        <legend className="font-semibold">At</legend>
        <div className="grid gap-x-6 sm:grid-cols-2 lg:grid-cols-3">
          {points.map((point) => (
            <Checkbox
              key={point.id}
              label={`${point.systemCode} ${point.name}`}
              checked={picked.has(point.id)}
              onChange={(event) => toggle(point.id, event.target.checked)}
            />
          ))}
        </div>
      </fieldset>
      <div className="mt-3 grid items-end gap-x-8 gap-y-4 lg:grid-cols-2">
        <div className="flex flex-wrap items-end gap-2.5">
          <Field label="Parameter" required className="grow">
            <Select
              placeholder="Choose a parameter"
              options={parameters.map((each) => ({ value: String(each.id), label: each.name }))}
              value={parameterId}
              onChange={(event) => setParameterId(event.target.value)}
            />
          </Field>
          <Button
            disabled={nothing || parameterId === ""}
            onClick={() => onAdd([...picked], Number(parameterId))}
          >
            Add rows
          </Button>
        </div>
        {templates.length > 0 && (
          <div className="flex flex-wrap items-end gap-2.5">
            <Field label="Template" required className="grow">
              <Select
                placeholder="Choose a template"
                options={templates.map((each) => ({ value: String(each.id), label: each.name }))}
                value={templateId}
                onChange={(event) => setTemplateId(event.target.value)}
              />
            </Field>
            <Button
              disabled={nothing || template === undefined}
              onClick={() => template && onLay([...picked], template)}
            >
              Lay the template
            </Button>
          </div>
        )}
      </div>
      {nothing && <p className="mt-2 text-sm text-ink-3">Tick where first.</p>}
    </Panel>
  );
}
