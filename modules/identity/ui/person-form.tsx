"use client";
import { useRouter } from "next/navigation";
import { Button, Field, FormError, sendCommand, TextInput, useLiveMessage, useProblemForm } from "@/lib/ui";
import { editPersonInput } from "../input";

export interface PersonFormProps {
  person: { id: number; name: string; email: string };
}

/** Corrects a name or an address. The history keeps both. */
export function PersonForm({ person }: PersonFormProps) {
  const router = useRouter();
  const say = useLiveMessage();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: editPersonInput,
    defaultValues: { personId: person.id, name: person.name, email: person.email },
    send: async ({ name, email }, idempotencyKey) => {
      await sendCommand(`/api/v1/people/${person.id}`, { name, email }, { idempotencyKey, method: "PATCH" });
      say({ text: "Stored." });
      router.refresh();
    },
  });
  return (
    <form onSubmit={submit} noValidate className="grid gap-5">
      <FormError problem={problem} labels={{ name: "Name", email: "E-mail address" }} />
      <Field label="Name" name="name" error={errorOf("name")} required>
        <TextInput autoComplete="off" {...form.register("name")} />
      </Field>
      <Field label="E-mail address" name="email" error={errorOf("email")} required>
        <TextInput type="email" autoComplete="off" {...form.register("email")} />
      </Field>
      <div>
        <Button type="submit" busy={sending} busyText="Storing …">
          Store name and address
        </Button>
      </div>
    </form>
  );
}
