"use client";
import { useFieldArray } from "react-hook-form";
import type { z } from "zod";
import { Button, Field, type ProblemForm, Select, TextInput } from "@/lib/ui";
import type { createParameterInput } from "../input";
import { ANSWER_MEANING_WORDS, ANSWER_MEANINGS } from "../model";

type Form = ProblemForm<z.input<typeof createParameterInput>, z.output<typeof createParameterInput>>;

export interface AnswersFieldProps {
  problemForm: Form;
  isYesNo: boolean;
  /** How many answers readings may carry already: their codes stay. */
  fixed: number;
}

const MEANINGS = ANSWER_MEANINGS.map((value) => ({ value, label: ANSWER_MEANING_WORDS[value] }));

/** The answers that may be given, and what each says about the water or the machine. */
export function AnswersField({ problemForm: { form, errorOf }, isYesNo, fixed }: AnswersFieldProps) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name: "choices" });
  const error = errorOf("choices") ?? errorOf("choices.root" as "choices");
  return (
    <Field label="Answers, and what each means" name="choices" group required error={error}>
      <div className="grid gap-3">
        {fields.map((field, index) => (
          <div key={field.id} className="grid items-start gap-2.5 sm:grid-cols-[1fr_1fr_1fr_auto]">
            <Field
              label="Code"
              name={`choices.${index}.code`}
              required
              error={errorOf(`choices.${index}.code`)}
            >
              <TextInput readOnly={isYesNo || index < fixed} {...form.register(`choices.${index}.code`)} />
            </Field>
            <Field
              label="Shown as"
              name={`choices.${index}.label`}
              required
              error={errorOf(`choices.${index}.label`)}
            >
              <TextInput {...form.register(`choices.${index}.label`)} />
            </Field>
            <Field label="Means" name={`choices.${index}.means`} required>
              <Select options={MEANINGS} {...form.register(`choices.${index}.means`)} />
            </Field>
            {!isYesNo && index >= fixed && (
              <Button
                className="sm:mt-7"
                onClick={() => remove(index)}
                aria-label={`Remove answer ${index + 1}`}
              >
                Remove
              </Button>
            )}
          </div>
        ))}
        {!isYesNo && (
          <div>
            <Button size="small" onClick={() => append({ code: "", label: "", means: "within" })}>
              Add an answer
            </Button>
          </div>
        )}
      </div>
    </Field>
  );
}
