"use client";
import { DateInput, Facts, Field, Notice, Panel, Quantity, TimeText } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { SeriesReading } from "../series-model";
import { MOST_FLAGS, type SeriesControl } from "./series-chart-data";

export interface BaselineDays {
  readonly fromOn: string;
  readonly toOn: string;
}

interface ControlPanelProps {
  control: SeriesControl;
  readings: readonly SeriesReading[];
  parameter: FacilityParameter;
  days: BaselineDays;
  onDays: (days: BaselineDays) => void;
  zone: string;
}

/** So many points beyond control are named one by one; the table marks them all. */
const NAMED = 20;

/** The control limits in words: what they are, from which baseline, and which points lie beyond them. */
export function ControlPanel({ control, readings, parameter, days, onDays, zone }: ControlPanelProps) {
  const { baseline } = control;
  return (
    <Panel title="Control limits" id="control">
      <div className="grid gap-4">
        <p className="prose text-ink-2">
          The dashed lines say where single readings lie while nothing changes: the mean of the baseline, and
          three standard deviations to each side, estimated from the differences of neighbouring readings
          (individuals chart, ISO 7870-2). They describe the water as it was and say nothing of what animals
          tolerate.
        </p>
        <div className="flex flex-wrap items-start gap-x-4 gap-y-3">
          <Field label="Baseline from" name="baseline-from" required>
            <DateInput
              value={days.fromOn}
              onChange={(event) => onDays({ ...days, fromOn: event.currentTarget.value })}
            />
          </Field>
          <Field label="to" name="baseline-to" required>
            <DateInput
              value={days.toOn}
              onChange={(event) => onDays({ ...days, toOn: event.currentTarget.value })}
            />
          </Field>
          {baseline.ok && <ControlFacts baseline={baseline} parameter={parameter} />}
        </div>
        {!baseline.ok && <Notice title="No control limits">{baseline.sentence}</Notice>}
        {baseline.ok && baseline.warning !== null && (
          <Notice kind="caution" title="these readings depend on each other">
            {baseline.warning}
          </Notice>
        )}
        {baseline.ok && (
          <BeyondList control={control} readings={readings} parameter={parameter} zone={zone} />
        )}
      </div>
    </Panel>
  );
}

function ControlFacts({
  baseline,
  parameter,
}: {
  baseline: Extract<SeriesControl["baseline"], { ok: true }>;
  parameter: FacilityParameter;
}) {
  const { centre, lower, upper, n } = baseline.limits;
  // one more digit than a reading has: a mean is known better than what it is made of
  const figure = (value: number) => (
    <Quantity value={value} decimals={parameter.decimals + 1} unit={unitLabel(parameter.unit)} />
  );
  return (
    <div className="sm:pl-4">
      <Facts
        facts={[
          { label: "Upper control", value: figure(upper) },
          { label: "Centre", value: figure(centre), note: `from ${n} readings` },
          { label: "Lower control", value: figure(lower) },
        ]}
      />
    </div>
  );
}

function BeyondList({
  control: { beyond },
  readings,
  parameter,
  zone,
}: Pick<ControlPanelProps, "control" | "readings" | "parameter" | "zone">) {
  if (beyond.length === 0) return <p>No reading since the baseline began lies beyond the control limits.</p>;
  const newest = beyond.slice(-NAMED).reverse();
  const rest = beyond.length - newest.length;
  if (beyond.length > MOST_FLAGS) {
    return (
      <p>
        <b className="font-semibold">
          {beyond.length.toLocaleString("en-GB")} of {readings.length.toLocaleString("en-GB")} readings lie
          beyond the control limits:
        </b>{" "}
        too many to be marked in the chart, so these lines do not describe this water. Choose a baseline that
        does, or a shorter period. The table marks them all.
      </p>
    );
  }
  return (
    <div>
      <p className="font-semibold">
        {beyond.length === 1 ? "1 reading lies" : `${beyond.length.toLocaleString("en-GB")} readings lie`}{" "}
        beyond the control limits
      </p>
      <ul className="mt-1.5 grid gap-x-8 gap-y-1 text-[0.9375rem] sm:grid-cols-2">
        {newest.map(({ index, side }) => {
          const reading = readings[index];
          if (!reading) return null;
          return (
            <li key={reading.id} className="flex flex-wrap gap-x-2 border-b border-rule py-1">
              <TimeText at={reading.at} zone={zone} />
              <Quantity
                value={reading.value}
                decimals={parameter.decimals}
                unit={unitLabel(parameter.unit)}
              />
              <span className="text-ink-2">{side === "upper" ? "above the upper" : "below the lower"}</span>
            </li>
          );
        })}
      </ul>
      {rest > 0 && (
        <p className="pt-2 text-sm text-ink-2">
          and {rest.toLocaleString("en-GB")} older ones; the table marks them all.
        </p>
      )}
    </div>
  );
}
