"use client";
import { Checkbox, Field, FormDialog, Select, sendCommand, TextInput, useProblemForm } from "@/lib/ui";
import { pointFormInput } from "../input";
import { POINT_KIND_WORDS, POINT_KINDS, type PointRow, type SystemRow } from "../model";
import { wordOptions } from "./options";

type PointFormProps = {
  system: SystemRow;
  point: PointRow | null;
  onClose: () => void;
  onDone: (text: string) => void;
};

/** A new point, or changes to one. */
export function PointForm({ system, point, onClose, onDone }: PointFormProps) {
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: pointFormInput,
    defaultValues: {
      code: point?.code ?? "",
      name: point?.name ?? "",
      kind: point?.kind ?? "surface",
      isDefault: point?.isDefault ?? false,
      isInUse: point?.isInUse ?? true,
    },
    send: async ({ isInUse, ...values }, idempotencyKey) => {
      if (point) {
        await sendCommand(
          `/api/v1/points/${point.id}`,
          { ...values, isInUse },
          { idempotencyKey, method: "PUT" },
        );
      } else {
        await sendCommand("/api/v1/points", { ...values, systemId: system.id }, { idempotencyKey });
      }
      onDone(`Point ${values.code} of ${system.code} is ${point ? "changed" : "added"}.`);
    },
  });
  return (
    <FormDialog
      title={point ? `Point ${point.code} of ${system.code}` : `New point of ${system.code}`}
      act={point ? "Save the point" : "Add the point"}
      onClose={onClose}
      onSubmit={submit}
      sending={sending}
      problem={problem}
    >
      <Field
        label="Code"
        name="code"
        required
        error={errorOf("code")}
        hint="Short and unique within the system: BOTTOM."
      >
        <TextInput {...form.register("code")} />
      </Field>
      <Field label="Name" name="name" required error={errorOf("name")}>
        <TextInput {...form.register("name")} />
      </Field>
      <Field label="Kind" name="kind" required error={errorOf("kind")}>
        <Select options={wordOptions(POINT_KINDS, POINT_KIND_WORDS)} {...form.register("kind")} />
      </Field>
      <Field label="Use" group required name="isDefault" error={errorOf("isDefault") ?? errorOf("isInUse")}>
        <Checkbox
          label="Default point"
          hint="Readings are taken here unless another point is named. There is always exactly one."
          {...form.register("isDefault")}
        />
        {point && (
          <Checkbox
            label="In use"
            hint="A point out of use keeps its readings and is no longer offered."
            {...form.register("isInUse")}
          />
        )}
      </Field>
    </FormDialog>
  );
}
