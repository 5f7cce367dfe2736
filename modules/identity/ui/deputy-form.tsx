"use client";
import { useRouter } from "next/navigation";
import {
  Button,
  DateInput,
  Field,
  FormError,
  Panel,
  Select,
  sendCommand,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import type { Role } from "@/modules/access";
import { nameDeputyInput } from "../input";
import { roleText } from "./role-words";

export interface DeputyFormProps {
  /** For whom a deputy may be named. */
  holders: readonly { id: number; name: string; roles: Role[] }[];
  people: readonly { id: number; name: string }[];
  /** "YYYY-MM-DD" in the facility's zone. */
  today: string;
}

const toOption = ({ id, name }: { id: number; name: string }) => ({ value: String(id), label: name });

/** Names a deputy. */
export function DeputyForm({ holders, people, today }: DeputyFormProps) {
  const router = useRouter();
  const say = useLiveMessage();
  const only = holders.length === 1 ? holders[0] : undefined;
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: nameDeputyInput,
    defaultValues: { personId: only?.id ?? "", deputyId: "", fromOn: today, toOn: today },
    send: async (values, idempotencyKey) => {
      await sendCommand("/api/v1/deputies", values, { idempotencyKey });
      say({ text: "Named." });
      form.reset();
      router.refresh();
    },
  });
  const personId = Number(form.watch("personId"));
  const roles = holders.find((holder) => holder.id === personId)?.roles ?? [];
  return (
    <Panel title="Name a deputy" className="mt-5 max-w-3xl">
      <form onSubmit={submit} noValidate className="grid gap-5">
        <FormError problem={problem} />
        <div className="grid gap-5 sm:grid-cols-2">
          <Field label="For" name="personId" error={errorOf("personId") && "Choose who is away."} required>
            <Select
              placeholder="Choose who is away"
              options={holders.map(toOption)}
              {...form.register("personId")}
            />
          </Field>
          <Field label="In the role" name="role" error={errorOf("role") && "Choose the role."} required>
            <Select
              placeholder="Choose the role"
              options={roles.map((role) => ({ value: role, label: roleText(role) }))}
              {...form.register("role")}
            />
          </Field>
          <Field label="Stands in" name="deputyId" error={deputyError(errorOf("deputyId"))} required>
            <Select
              placeholder="Choose who stands in"
              options={people.filter(({ id }) => id !== personId).map(toOption)}
              {...form.register("deputyId")}
            />
          </Field>
          <div className="flex flex-wrap gap-5">
            <Field label="First day" name="fromOn" error={errorOf("fromOn")} required>
              <DateInput min={today} {...form.register("fromOn")} />
            </Field>
            <Field label="Last day" name="toOn" error={errorOf("toOn")} required>
              <DateInput min={today} {...form.register("toOn")} />
            </Field>
          </div>
        </div>
        <div>
          <Button type="submit" variant="next" busy={sending} busyText="Storing …">
            Name the deputy
          </Button>
        </div>
      </form>
    </Panel>
  );
}

const deputyError = (error: string | undefined) =>
  error === undefined || error === "Name somebody else." ? error : "Choose who stands in.";
