"use client";
import { type UseFormReturn, useWatch } from "react-hook-form";
import type { z } from "zod";
import { Checkbox, Field } from "@/lib/ui";
import { acceptedUnits, findUnit, unitLabel } from "@/lib/units/factors";
import type { createParameterInput } from "../input";

type Form = UseFormReturn<
  z.input<typeof createParameterInput>,
  unknown,
  z.output<typeof createParameterInput>
>;

/** In which units a value may be typed: those that measure the same thing, the stored one always among them. */
export function UnitsField({ form, error }: { form: Form; error?: string }) {
  const unit = useWatch({ control: form.control, name: "unit" }) ?? "";
  const accepted = useWatch({ control: form.control, name: "acceptedUnits" }) ?? [];
  const stored = findUnit(unit);
  if (!stored) return null;
  const ticked = new Set([stored.code, ...accepted]);
  const offered = acceptedUnits(stored.dimension);
  const set = (codes: Set<string>) =>
    form.setValue(
      "acceptedUnits",
      offered.map((each) => each.code).filter((code) => codes.has(code)),
      { shouldDirty: true, shouldValidate: true },
    );
  return (
    <Field label="May be typed in" name="acceptedUnits" group required error={error}>
      <div className="flex flex-wrap gap-x-6">
        {offered.map((each) => (
          <Checkbox
            key={each.code}
            label={unitLabel(each.code) || each.code}
            checked={ticked.has(each.code)}
            disabled={each.code === stored.code}
            onChange={(event) => {
              const next = new Set(ticked);
              if (event.target.checked) next.add(each.code);
              else next.delete(each.code);
              set(next);
            }}
          />
        ))}
      </div>
    </Field>
  );
}
