"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { useCallback, useRef, useState } from "react";
import {
  type DefaultValues,
  type FieldErrors,
  type FieldPath,
  type FieldValues,
  get,
  type UseFormReturn,
  useForm,
} from "react-hook-form";
import { z } from "zod";
import { ApiProblem, NetworkProblem } from "./api";
import { pointerToPath } from "./json-pointer";

// A strict content security policy forbids `eval`, with which zod would compile its parsers.
if (typeof window !== "undefined") z.config({ jitless: true });

export interface ProblemFormOptions<Input extends FieldValues, Output> {
  /** The zod schema of the module's input.ts; the server checks the same one. */
  schema: z.ZodType<Output, Input>;
  defaultValues: DefaultValues<Input>;
  /**
   * Sends the form. The key is the same for every try until one succeeds, so a second press stores nothing twice.
   * @throws ApiProblem | NetworkProblem: shown; anything else is thrown on
   */
  send: (values: Output, idempotencyKey: string) => Promise<void>;
}

export interface ProblemForm<Input extends FieldValues, Output> {
  form: UseFormReturn<Input, unknown, Output>;
  /** What the server (or the network) said last; feed it to FormError. */
  problem: ApiProblem | NetworkProblem | null;
  /** For `<form onSubmit>`. */
  submit: (event?: React.BaseSyntheticEvent) => Promise<void>;
  /** The sentence under a field, whoever said it: the form's own check or the server. */
  errorOf: (path: FieldPath<Input>) => string | undefined;
  sending: boolean;
}

/** One form: react-hook-form with its zod schema; refusals of the server land under the fields they point at. */
export function useProblemForm<Input extends FieldValues, Output = Input>({
  schema,
  defaultValues,
  send,
}: ProblemFormOptions<Input, Output>): ProblemForm<Input, Output> {
  const form = useForm<Input, unknown, Output>({
    resolver: zodResolver(schema),
    defaultValues,
    mode: "onTouched",
  });
  const [problem, setProblem] = useState<ApiProblem | NetworkProblem | null>(null);
  const key = useRef<string | null>(null);

  const sendOnce = async (values: Output) => {
    key.current ??= crypto.randomUUID();
    setProblem(null);
    try {
      await send(values, key.current);
      key.current = null;
    } catch (error) {
      if (!(error instanceof ApiProblem || error instanceof NetworkProblem)) throw error;
      // A refused act is over: what is sent next has other content and is another act.
      if (error instanceof ApiProblem && error.status < 500) key.current = null;
      setProblem(error);
      if (error instanceof ApiProblem) placeErrors(form, error);
    }
  };
  const submit = (event?: React.BaseSyntheticEvent) => form.handleSubmit(sendOnce)(event);

  const { errors } = form.formState;
  const errorOf = useCallback((path: FieldPath<Input>) => messageAt(errors, path), [errors]);
  return { form, problem, submit, errorOf, sending: form.formState.isSubmitting };
}

function placeErrors<Input extends FieldValues, Output>(
  form: UseFormReturn<Input, unknown, Output>,
  problem: ApiProblem,
): void {
  let first = true;
  for (const error of problem.errors) {
    const path = pointerToPath(error.pointer);
    if (path === "") continue;
    form.setError(
      path as FieldPath<Input>,
      { type: "server", message: error.detail },
      { shouldFocus: first },
    );
    first = false;
  }
}

function messageAt(errors: FieldErrors, path: string): string | undefined {
  const found: unknown = get(errors, path);
  if (typeof found !== "object" || found === null || !("message" in found)) return undefined;
  return typeof found.message === "string" ? found.message : undefined;
}
