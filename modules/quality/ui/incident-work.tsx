"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { systemClock } from "@/lib/clock";
import {
  Button,
  Field,
  FormError,
  Select,
  sendCommand,
  Textarea,
  useAct,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { noteForm } from "../input";
import { dueIn, RECHECK_OPTIONS } from "./incident-words";

/** Writes down what was seen or done. */
export function NoteForm({ incidentId }: { incidentId: number }) {
  const router = useRouter();
  const say = useLiveMessage();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: noteForm,
    defaultValues: { text: "" },
    send: async ({ text }, idempotencyKey) => {
      await sendCommand(`/api/v1/incidents/${incidentId}/notes`, { text }, { idempotencyKey });
      form.reset();
      say({ text: "Noted." });
      router.refresh();
    },
  });
  return (
    <form onSubmit={submit} noValidate className="mt-4 grid gap-3">
      <FormError problem={problem} />
      <Field label="What you saw or did" name="text" required error={errorOf("text")}>
        <Textarea rows={3} {...form.register("text")} />
      </Field>
      <div>
        <Button type="submit" busy={sending} busyText="Storing …">
          Add the note
        </Button>
      </div>
    </form>
  );
}

export interface RecheckFormProps {
  incidentId: number;
  /** Readings of the same trouble since it began, as one line each. */
  candidates: readonly { id: number; label: string }[];
  systemCode: string;
}

/** Names the reading that is the recheck. */
export function RecheckForm({ incidentId, candidates, systemCode }: RecheckFormProps) {
  const { act, busy, problem } = useAct();
  const [readingId, setReadingId] = useState(String(candidates[0]?.id ?? ""));
  if (candidates.length === 0) {
    return (
      <p className="text-ink-2">
        No reading has been taken since it began. Measure again at{" "}
        <a href={`/systems/${systemCode}/entry`}>{systemCode}</a>; the reading can then be named here as the
        recheck.
      </p>
    );
  }
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        void act(
          `/api/v1/incidents/${incidentId}/recheck`,
          { readingId },
          { done: "The recheck is recorded." },
        );
      }}
    >
      <FormError problem={problem} />
      <Field label="The reading that is the recheck" name="recheck" required>
        <Select
          options={candidates.map(({ id, label }) => ({ value: String(id), label }))}
          value={readingId}
          onChange={(event) => setReadingId(event.target.value)}
        />
      </Field>
      <div>
        <Button type="submit" busy={busy} busyText="Storing …">
          Record the recheck
        </Button>
      </div>
    </form>
  );
}

export interface CareFormsProps {
  incidentId: number;
  ownerId: number;
  people: readonly { id: number; name: string }[];
}

/** Who is waited for, and until when it is measured again. */
export function CareForms({ incidentId, ownerId, people }: CareFormsProps) {
  const { act, busy } = useAct();
  const [hours, setHours] = useState("");
  const [owner, setOwner] = useState(String(ownerId));
  const path = `/api/v1/incidents/${incidentId}`;
  return (
    <div className="grid gap-4">
      <form
        className="flex flex-wrap items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          void act(`${path}/owner`, { ownerId: owner }, { done: "Given." });
        }}
      >
        <Field label="Who takes care of it" name="owner" required className="min-w-52 grow">
          <Select
            options={people.map(({ id, name }) => ({ value: String(id), label: name }))}
            value={owner}
            onChange={(event) => setOwner(event.target.value)}
          />
        </Field>
        <Button type="submit" busy={busy} disabled={owner === String(ownerId)}>
          Give it
        </Button>
      </form>
      <form
        className="flex flex-wrap items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          const recheckDueAt = dueIn(Number(hours), systemClock.now());
          void act(
            `${path}/recheck-due`,
            { recheckDueAt },
            { done: "The recheck is set.", then: () => setHours("") },
          );
        }}
      >
        <Field label="Measure again" name="recheckHours" required className="min-w-52 grow">
          <Select
            placeholder="Choose when"
            options={RECHECK_OPTIONS.filter(({ value }) => value !== "")}
            value={hours}
            onChange={(event) => setHours(event.target.value)}
          />
        </Field>
        <Button type="submit" busy={busy} disabled={hours === ""}>
          Set the recheck
        </Button>
      </form>
    </div>
  );
}
