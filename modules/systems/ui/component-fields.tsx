"use client";
import { Button, Checkbox, Field, RadioButtons, Select, TextInput } from "@/lib/ui";
import {
  LENGTH_UNITS,
  type LengthUnit,
  SHAPES,
  type Shape,
  type TypedComponent,
  VOLUME_UNITS,
  type VolumeUnit,
} from "../model";
import { SHAPE_TABLE } from "../shapes.data";
import { litresOf, NOTHING_TYPED, readingOf, unitOf, withShape } from "./component-state";
import { QuantityFields } from "./quantity-fields";
import { VolumeQuantity } from "./volume-quantity";

type ComponentFieldsProps = {
  index: number;
  component: TypedComponent;
  /** After a try to send, empty fields are mistakes too. */
  showAll: boolean;
  unit: VolumeUnit;
  onChange: (component: TypedComponent) => void;
  onRemove: (() => void) | null;
};

const SHAPE_OPTIONS = SHAPES.map((shape) => ({ value: shape, label: SHAPE_TABLE[shape].label }));
const plain = (units: readonly string[]) => units.map((unit) => ({ value: unit, label: unit }));

/** One piece of a system's geometry, with what it holds as soon as it can be told. */
export function ComponentFields({
  index,
  component,
  showAll,
  unit,
  onChange,
  onRemove,
}: ComponentFieldsProps) {
  const base = `components.${index}`;
  const { says, inputs, pointing, hasLevel } = SHAPE_TABLE[component.shape];
  const { volume, problems } = readingOf(component);
  const errorAt = (path: string) =>
    problems.find((each) => each.path === path && (showAll || !each.isUntouched))?.message;
  const change = (part: Partial<TypedComponent>) => onChange({ ...component, ...part });
  const title = component.name.trim() || `Component ${index + 1}`;
  return (
    <fieldset className="grid gap-4 border border-rule px-4 pt-2 pb-4">
      <legend className="px-1 font-semibold">{title}</legend>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          label="Name"
          name={`${base}.name`}
          required
          error={showAll && component.name.trim() === "" ? "Name this component." : undefined}
        >
          <TextInput value={component.name} onChange={(event) => change({ name: event.target.value })} />
        </Field>
        <Field label="Shape" name={`${base}.shape`} required hint={says}>
          <Select
            options={SHAPE_OPTIONS}
            value={component.shape}
            onChange={(event) => onChange(withShape(component, event.target.value as Shape))}
          />
        </Field>
        <Field label="Lengths in" name={`${base}.lengthUnit`} required>
          <Select
            options={plain(LENGTH_UNITS)}
            value={component.lengthUnit}
            onChange={(event) => change({ lengthUnit: event.target.value as LengthUnit })}
          />
        </Field>
        <Field label="Volumes in" name={`${base}.volumeUnit`} required>
          <Select
            options={plain(VOLUME_UNITS)}
            value={component.volumeUnit}
            onChange={(event) => change({ volumeUnit: event.target.value as VolumeUnit })}
          />
        </Field>
      </div>
      {pointing && (
        <Field label={pointing.question} group required>
          <RadioButtons
            name={`${base}.pointing`}
            options={[
              { value: "down", label: pointing.down },
              { value: "up", label: pointing.up },
            ]}
            value={component.pointing}
            onChange={(event) => change({ pointing: event.target.value === "up" ? "up" : "down" })}
          />
        </Field>
      )}
      <div className="grid gap-4 lg:grid-cols-2">
        {inputs.map((input) => (
          <QuantityFields
            key={input.name}
            label={input.label}
            name={`${base}.dimensions.${input.name}`}
            unit={unitOf(component, input.kind)}
            value={component.dimensions[input.name] ?? NOTHING_TYPED}
            error={errorAt(`dimensions.${input.name}`)}
            onChange={(typed) => change({ dimensions: { ...component.dimensions, [input.name]: typed } })}
          />
        ))}
        {component.fillDepth && (
          <QuantityFields
            label="Depth of water"
            name={`${base}.fillDepth`}
            unit={component.lengthUnit}
            hint="From the lowest place inside to the surface."
            value={component.fillDepth}
            error={errorAt("fillDepth")}
            onChange={(fillDepth) => change({ fillDepth })}
          />
        )}
        {component.displacement && (
          <QuantityFields
            label="Taken up by rockwork"
            name={`${base}.displacement`}
            unit={component.volumeUnit}
            hint="What stands in the water and is not water."
            value={component.displacement}
            error={errorAt("displacement")}
            onChange={(displacement) => change({ displacement })}
          />
        )}
      </div>
      <div className="flex flex-wrap gap-x-6 gap-y-1">
        {hasLevel && (
          <Checkbox
            label="Full"
            checked={component.fillDepth === null}
            onChange={(event) => change({ fillDepth: event.target.checked ? null : NOTHING_TYPED })}
          />
        )}
        <Checkbox
          label="Rockwork or columns in it"
          checked={component.displacement !== null}
          onChange={(event) => change({ displacement: event.target.checked ? NOTHING_TYPED : null })}
        />
        {hasLevel && (
          <Checkbox
            label="The system's water level stands in it"
            checked={component.isAtSurface}
            onChange={(event) => change({ isAtSurface: event.target.checked })}
          />
        )}
      </div>
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
        <span>
          Holds <b>{<VolumeQuantity volumeL={volume && litresOf(volume)} unit={unit} />}</b>
        </span>
        {onRemove && (
          <Button
            size="small"
            variant="quiet"
            className="ml-auto"
            aria-label={`Remove ${title}`}
            onClick={onRemove}
          >
            Remove
          </Button>
        )}
      </div>
    </fieldset>
  );
}
