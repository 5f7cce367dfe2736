"use client";
import { useRouter } from "next/navigation";
import { type ReactNode, type SyntheticEvent, useId, useState } from "react";
import {
  type ApiProblem,
  Button,
  ButtonRow,
  Dialog,
  Field,
  FormError,
  type NetworkProblem,
  NumberInput,
  Select,
  sendCommand,
  Textarea,
  TextInput,
  useAct,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import { correctReadingInput, explainReadingInput, voidReadingInput } from "../input";

export interface ReadingActsProps {
  readingId: number;
  typedText: string;
  typedUnit: string | null;
  parameter: FacilityParameter;
  /** It is off and nobody has confirmed it. */
  canConfirm: boolean;
  may: { readonly record: boolean; readonly correct: boolean; readonly explain: boolean };
}

/** What may be done with a reading that counts: correct, strike out, confirm, explain. */
export function ReadingActs(props: ReadingActsProps) {
  const { readingId, canConfirm, may } = props;
  const [open, setOpen] = useState<"correct" | "void" | "explain" | null>(null);
  const { act, busy } = useAct();
  const close = () => setOpen(null);
  return (
    <ButtonRow>
      {canConfirm && may.record && (
        <Button
          variant="next"
          busy={busy}
          onClick={() => void act(`/api/v1/readings/${readingId}/confirmation`, {}, { done: "Confirmed." })}
        >
          It really shows this
        </Button>
      )}
      {may.explain && <Button onClick={() => setOpen("explain")}>Explain…</Button>}
      {may.correct && <Button onClick={() => setOpen("correct")}>Correct…</Button>}
      {may.correct && (
        <Button variant="danger" onClick={() => setOpen("void")}>
          Strike out…
        </Button>
      )}
      {open === "correct" && <CorrectDialog {...props} onClose={close} />}
      {open === "void" && <VoidDialog readingId={readingId} onClose={close} />}
      {open === "explain" && <ExplainDialog readingId={readingId} onClose={close} />}
    </ButtonRow>
  );
}

const correctFields = correctReadingInput.pick({ typedText: true, typedUnit: true, reason: true });

function CorrectDialog({
  readingId,
  typedText,
  typedUnit,
  parameter,
  onClose,
}: ReadingActsProps & { onClose: () => void }) {
  const router = useRouter();
  const say = useLiveMessage();
  const { form, submit, errorOf, sending, problem } = useProblemForm({
    schema: correctFields,
    defaultValues: { typedText: "", typedUnit: typedUnit ?? undefined, reason: "" },
    send: async (values, idempotencyKey) => {
      const path = `/api/v1/readings/${readingId}/correction`;
      const body = { ...values, typedUnit: values.typedUnit ?? null, uuid: idempotencyKey };
      const { data } = await sendCommand<{ data: { readingId: number } }>(path, body, { idempotencyKey });
      onClose();
      say({ text: "Corrected. The old value stays beside the new one." });
      router.push(`/readings/${data.readingId}`);
    },
  });
  return (
    <ActDialog
      title="Correct this reading"
      act="Put the new value beside it"
      {...{ submit, sending, problem, onClose }}
    >
      <p className="text-ink-2">
        It says <b className="num">{typedText}</b>
        {unitLabel(typedUnit) !== "" && ` ${unitLabel(typedUnit)}`}. The old value stays readable, and a
        review of the day is asked for again.
      </p>
      <ValueField parameter={parameter} error={errorOf("typedText")} register={form.register("typedText")} />
      {parameter.acceptedUnits.length > 1 && (
        <Field label="Unit" name="typedUnit" required error={errorOf("typedUnit")}>
          <Select
            {...form.register("typedUnit")}
            options={parameter.acceptedUnits.map((unit) => ({
              value: unit,
              label: unitLabel(unit) || "number",
            }))}
          />
        </Field>
      )}
      <Field label="Why" name="reason" required hint="It goes into the history." error={errorOf("reason")}>
        <Textarea rows={3} {...form.register("reason")} />
      </Field>
    </ActDialog>
  );
}

interface ValueFieldProps {
  parameter: FacilityParameter;
  error: string | undefined;
  register: object;
}

/** The new value, in the control that fits its kind. */
function ValueField({ parameter, error, register }: ValueFieldProps) {
  const { kind, choices, mayBeNegative, acceptedUnits, unit } = parameter;
  const answers = choices.length > 0 ? choices : kind === "yes-no" ? YES_NO : [];
  return (
    <Field label="New value" name="typedText" required error={error}>
      {kind === "choice" || kind === "yes-no" ? (
        <Select
          {...register}
          placeholder="Choose the answer"
          options={answers.map((each) => ({ value: each.code, label: each.label }))}
        />
      ) : kind === "text" ? (
        <TextInput {...register} />
      ) : (
        <NumberInput
          {...register}
          signed={mayBeNegative}
          unit={acceptedUnits.length > 1 ? "" : unitLabel(unit)}
        />
      )}
    </Field>
  );
}

const YES_NO = [
  { code: "yes", label: "Yes" },
  { code: "no", label: "No" },
];

function VoidDialog({ readingId, onClose }: { readingId: number; onClose: () => void }) {
  const router = useRouter();
  const say = useLiveMessage();
  const { form, submit, errorOf, sending, problem } = useProblemForm({
    schema: voidReadingInput.pick({ reason: true }),
    defaultValues: { reason: "" },
    send: async ({ reason }, idempotencyKey) => {
      await sendCommand(`/api/v1/readings/${readingId}/void`, { reason }, { idempotencyKey });
      onClose();
      say({ text: "Struck out. It stays readable and counts no more." });
      router.refresh();
    },
  });
  return (
    <ActDialog title="Strike this reading out" act="Strike it out" {...{ submit, sending, problem, onClose }}>
      <p className="text-ink-2">
        For a value that belongs nowhere: typed for the wrong system, say. A wrong value is corrected instead.
        It stays readable and counts no more; this cannot be undone.
      </p>
      <Field label="Why" name="reason" required hint="It goes into the history." error={errorOf("reason")}>
        <Textarea rows={3} {...form.register("reason")} />
      </Field>
    </ActDialog>
  );
}

function ExplainDialog({ readingId, onClose }: { readingId: number; onClose: () => void }) {
  const router = useRouter();
  const say = useLiveMessage();
  const { form, submit, errorOf, sending, problem } = useProblemForm({
    schema: explainReadingInput.pick({ text: true }),
    defaultValues: { text: "" },
    send: async ({ text }, idempotencyKey) => {
      await sendCommand(`/api/v1/readings/${readingId}/explanation`, { text }, { idempotencyKey });
      onClose();
      say({ text: "The explanation is kept with the reading." });
      router.refresh();
    },
  });
  return (
    <ActDialog
      title="Explain this reading"
      act="Keep the explanation"
      {...{ submit, sending, problem, onClose }}
    >
      <Field label="What was found, what was done" name="text" required error={errorOf("text")}>
        <Textarea rows={4} {...form.register("text")} />
      </Field>
    </ActDialog>
  );
}

interface ActDialogProps {
  title: string;
  act: string;
  submit: (event?: SyntheticEvent) => Promise<void>;
  sending: boolean;
  problem: ApiProblem | NetworkProblem | null;
  onClose: () => void;
  children: ReactNode;
}

function ActDialog({ title, act, submit, sending, problem, onClose, children }: ActDialogProps) {
  const formId = useId();
  return (
    <Dialog
      open
      onClose={onClose}
      title={title}
      dismissable={false}
      actions={
        <>
          <Button variant="next" type="submit" form={formId} busy={sending} busyText="Sending">
            {act}
          </Button>
          <Button onClick={onClose}>Leave it as it is</Button>
        </>
      }
    >
      <form id={formId} onSubmit={submit} noValidate className="grid gap-4">
        <FormError problem={problem} />
        {children}
      </form>
    </Dialog>
  );
}
