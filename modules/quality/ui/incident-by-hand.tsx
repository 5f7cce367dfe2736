"use client";
import { useRouter } from "next/navigation";
import { systemClock } from "@/lib/clock";
import { Button, Field, FormError, Select, sendCommand, Textarea, TextInput, useProblemForm } from "@/lib/ui";
import { incidentByHandForm } from "../input";
import { dueIn, RECHECK_OPTIONS } from "./incident-words";

/** Opens an incident about a system as a whole, where no single reading says it. */
export function IncidentByHand({
  systems,
}: {
  systems: readonly { id: number; code: string; name: string }[];
}) {
  const router = useRouter();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: incidentByHandForm,
    defaultValues: { systemId: "", title: "", note: "", recheckHours: "" },
    send: async ({ systemId, title, note, recheckHours }, idempotencyKey) => {
      const body = { systemId, title, note, recheckDueAt: dueIn(recheckHours, systemClock.now()) };
      const { data } = await sendCommand<{ data: { incidentId: number } }>("/api/v1/incidents", body, {
        idempotencyKey,
      });
      router.push(`/incidents/${data.incidentId}`);
    },
  });
  return (
    <form onSubmit={submit} noValidate className="grid max-w-xl gap-5">
      <FormError problem={problem} labels={{ systemId: "System", title: "What is wrong" }} />
      <Field label="System" name="systemId" required error={errorOf("systemId")}>
        <Select
          placeholder="Choose a system"
          options={systems.map(({ id, code, name }) => ({ value: String(id), label: `${code} ${name}` }))}
          {...form.register("systemId")}
        />
      </Field>
      <Field label="What is wrong" name="title" required error={errorOf("title")}>
        <TextInput {...form.register("title")} />
      </Field>
      <Field label="What you saw or did" name="note" error={errorOf("note")}>
        <Textarea rows={4} {...form.register("note")} />
      </Field>
      <Field label="Look again" name="recheckHours" error={errorOf("recheckHours")}>
        <Select options={RECHECK_OPTIONS} {...form.register("recheckHours")} />
      </Field>
      <div>
        <Button type="submit" variant="next" busy={sending} busyText="Opening …">
          Open the incident
        </Button>
      </div>
    </form>
  );
}
