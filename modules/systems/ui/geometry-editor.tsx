"use client";
import { type SyntheticEvent, useState } from "react";
import { Button, ButtonRow, Checkbox, Field, FormError, numberText, Panel, Textarea } from "@/lib/ui";
import type { TypedComponent } from "../model";
import { ComponentFields } from "./component-fields";
import { newComponent, readingOf, runningTotal } from "./component-state";
import { EffectiveFromField } from "./effective-from-field";
import { useProposal } from "./use-proposal";
import { VolumeQuantity } from "./volume-quantity";
import type { ReadingUnits } from "./volume-units";

type GeometryEditorProps = {
  systemId: number;
  /** The components to begin with: those of the newest determination, if there is one. */
  begin: readonly TypedComponent[];
  units: ReadingUnits;
  zone: string;
  onClose: () => void;
  onDone: (text: string) => void;
};

type Keyed = { key: number; component: TypedComponent };

/** A volume summed from pieces; the total moves with every figure typed. */
export function GeometryEditor({ systemId, begin, units, zone, onClose, onDone }: GeometryEditorProps) {
  const [pieces, setPieces] = useState<Keyed[]>(() =>
    (begin.length > 0 ? begin : [newComponent(units, true)]).map((component, key) => ({ key, component })),
  );
  const [isOneTape, setOneTape] = useState(false);
  const [note, setNote] = useState("");
  const [effectiveFromAt, setEffectiveFromAt] = useState<number | null | undefined>(null);
  const [showAll, setShowAll] = useState(false);
  const { problem, sending, send } = useProposal(onDone);

  const components = pieces.map((piece) => piece.component);
  const correlation = isOneTape ? 1 : 0;
  const { total, surfaceAreaM2, unread } = runningTotal(components, correlation);
  const isReady =
    effectiveFromAt !== undefined &&
    components.every((component) => readingOf(component).volume !== null && component.name.trim() !== "");

  const replace = (key: number, component: TypedComponent) =>
    setPieces(pieces.map((piece) => (piece.key === key ? { key, component } : piece)));
  const add = () => {
    const key = Math.max(-1, ...pieces.map((piece) => piece.key)) + 1;
    setPieces([...pieces, { key, component: newComponent(units, pieces.length === 0) }]);
    setShowAll(false);
  };
  const submit = async (event: SyntheticEvent) => {
    event.preventDefault();
    setShowAll(true);
    if (isReady) await send({ method: "geometry", systemId, components, correlation, note, effectiveFromAt });
  };

  return (
    <Panel title="Propose a volume from its geometry">
      <form onSubmit={submit} noValidate className="grid gap-5">
        <FormError problem={problem} />
        <p className="prose text-ink-2">
          Inner dimensions only, as the water sees them. After ± stands the standard uncertainty: how far the
          figure may well be off, as one standard deviation. A reading of a tape to the nearest centimetre is
          good to about 0.3 cm.
        </p>
        {pieces.map(({ key, component }, index) => (
          <ComponentFields
            key={key}
            index={index}
            component={component}
            showAll={showAll}
            unit={units.volume}
            onChange={(next) => replace(key, next)}
            onRemove={pieces.length > 1 ? () => setPieces(pieces.filter((piece) => piece.key !== key)) : null}
          />
        ))}
        <div>
          <Button onClick={add}>Add a component</Button>
        </div>
        <output className="block border-y border-rule py-3 text-lg" aria-live="polite">
          Together <b>{<VolumeQuantity volumeL={total} unit={units.volume} />}</b>
          <span className="block text-sm text-ink-3">
            {unread > 0 && `${unread === 1 ? "1 component" : `${unread} components`} not yet complete. `}
            {surfaceAreaM2 > 0
              ? `Open surface ${numberText(surfaceAreaM2, 2)} m²: a centimetre of level is ${numberText(surfaceAreaM2 * 10, 0)} L.`
              : !components.some((component) => component.isAtSurface) &&
                "No component holds the water level: changes of level cannot be counted."}
          </span>
        </output>
        <Checkbox
          label="All measured with the same tape or rule"
          hint="Its error is then in every component alike, and the uncertainties add up plainly (GUM 5.2.2)."
          checked={isOneTape}
          onChange={(event) => setOneTape(event.target.checked)}
        />
        <EffectiveFromField zone={zone} onChange={setEffectiveFromAt} showAll={showAll} />
        <Field label="Note" name="note" hint="Who measured, with what, from which drawing.">
          <Textarea value={note} onChange={(event) => setNote(event.target.value)} />
        </Field>
        {showAll && !isReady && (
          <p role="alert" className="font-semibold text-out">
            Not sent yet: complete the fields that say so above.
          </p>
        )}
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
