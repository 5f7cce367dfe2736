"use client";
import { type SyntheticEvent, useState } from "react";
import { Button, ButtonRow, Checkbox, Field, FormError, Panel, Select, Textarea } from "@/lib/ui";
import { VOLUME_UNITS, type VolumeUnit } from "../model";
import { readDecimal } from "../rules/typed-component";
import { NOTHING_TYPED } from "./component-state";
import { EffectiveFromField } from "./effective-from-field";
import { QuantityFields } from "./quantity-fields";
import { useProposal } from "./use-proposal";
import type { ReadingUnits } from "./volume-units";

type TracerFormProps = {
  systemId: number;
  units: ReadingUnits;
  zone: string;
  onClose: () => void;
  onDone: (text: string) => void;
};

const UNIT_OPTIONS = VOLUME_UNITS.map((unit) => ({ value: unit, label: unit }));

const isAboveZero = (text: string): boolean => (readDecimal(text) ?? 0) > 0;

/** A volume found by adding a known amount of something and measuring what it rose to. */
export function TracerForm({ systemId, units, zone, onClose, onDone }: TracerFormProps) {
  const [volume, setVolume] = useState(NOTHING_TYPED);
  const [volumeUnit, setVolumeUnit] = useState<VolumeUnit>(units.volume);
  const [surface, setSurface] = useState<typeof NOTHING_TYPED | null>(null);
  const [note, setNote] = useState("");
  const [effectiveFromAt, setEffectiveFromAt] = useState<number | null | undefined>(null);
  const [showAll, setShowAll] = useState(false);
  const { problem, sending, send } = useProposal(onDone);
  const isReady =
    isAboveZero(volume.text) &&
    (surface === null || isAboveZero(surface.text)) &&
    note.trim().length >= 3 &&
    effectiveFromAt !== undefined;
  const submit = async (event: SyntheticEvent) => {
    event.preventDefault();
    setShowAll(true);
    if (!isReady) return;
    await send({
      method: "tracer",
      systemId,
      volume,
      volumeUnit,
      surfaceArea: surface,
      note,
      effectiveFromAt,
    });
  };
  return (
    <Panel title="Propose a volume from a tracer test">
      <form onSubmit={submit} noValidate className="grid gap-5">
        <FormError problem={problem} />
        <div className="grid gap-4 sm:grid-cols-[1fr_10rem]">
          <QuantityFields
            label="Volume"
            name="volume"
            unit={volumeUnit}
            value={volume}
            onChange={setVolume}
            error={showAll && !isAboveZero(volume.text) ? "Type a number above 0, such as 12500." : undefined}
          />
          <Field label="Unit" name="volumeUnit" required>
            <Select
              options={UNIT_OPTIONS}
              value={volumeUnit}
              onChange={(event) => setVolumeUnit(event.target.value as VolumeUnit)}
            />
          </Field>
        </div>
        <Checkbox
          label="The area of the open surface is known"
          hint="With it, changes of level can be counted."
          checked={surface !== null}
          onChange={(event) => setSurface(event.target.checked ? NOTHING_TYPED : null)}
        />
        {surface && (
          <QuantityFields
            label="Area of the surface"
            name="surfaceArea"
            unit="m²"
            value={surface}
            onChange={setSurface}
            error={showAll && !isAboveZero(surface.text) ? "Type a number above 0, such as 8.4." : undefined}
          />
        )}
        <EffectiveFromField zone={zone} onChange={setEffectiveFromAt} showAll={showAll} />
        <Field
          label="How it was done"
          name="note"
          required
          hint="What was added, how much, what it rose to, how long it was mixed."
          error={
            showAll && note.trim().length < 3
              ? "Say what was added, how much, and what it rose to."
              : undefined
          }
        >
          <Textarea value={note} onChange={(event) => setNote(event.target.value)} />
        </Field>
        <ButtonRow>
          <Button variant="next" type="submit" busy={sending} busyText="Sending">
            Propose this volume
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </ButtonRow>
      </form>
    </Panel>
  );
}
