"use client";
import { useRouter } from "next/navigation";
import { Controller } from "react-hook-form";
import {
  Button,
  ButtonRow,
  Field,
  FormError,
  LinkButton,
  sendCommand,
  TextInput,
  useLiveMessage,
  useProblemForm,
} from "@/lib/ui";
import { invitePersonInput } from "../input";
import { PickMany } from "./pick-many";
import { ROLE_OPTIONS } from "./role-words";

export interface InviteFormProps {
  areas: readonly { id: number; name: string }[];
}

/** Name, address, roles and areas of somebody new; sends the invitation. */
export function InviteForm({ areas }: InviteFormProps) {
  const router = useRouter();
  const say = useLiveMessage();
  const { form, problem, submit, errorOf, sending } = useProblemForm({
    schema: invitePersonInput,
    defaultValues: { name: "", email: "", roles: [], areaIds: [] },
    send: async (values, idempotencyKey) => {
      await sendCommand("/api/v1/people", values, { idempotencyKey });
      say({ text: `The invitation to ${values.name} is on its way.` });
      router.push("/setup/people");
      router.refresh();
    },
  });
  return (
    <form onSubmit={submit} noValidate className="grid max-w-2xl gap-6">
      <FormError problem={problem} labels={{ name: "Name", email: "E-mail address" }} />
      <Field label="Name" name="name" error={errorOf("name")} required>
        <TextInput autoComplete="off" {...form.register("name")} />
      </Field>
      <Field
        label="E-mail address"
        name="email"
        hint="The invitation goes here, and it is what the person signs in with."
        error={errorOf("email")}
        required
      >
        <TextInput type="email" autoComplete="off" {...form.register("email")} />
      </Field>
      <Controller
        control={form.control}
        name="roles"
        render={({ field }) => (
          <PickMany
            label="Roles"
            options={ROLE_OPTIONS}
            value={field.value ?? []}
            onChange={field.onChange}
          />
        )}
      />
      {areas.length > 0 && (
        <Controller
          control={form.control}
          name="areaIds"
          render={({ field }) => (
            <PickMany
              label="Areas"
              hint="An aquarist with no area chosen works in all of them. Other roles are not bound to areas."
              options={areas.map((area) => ({ value: area.id, label: area.name }))}
              value={(field.value ?? []) as number[]}
              onChange={field.onChange}
            />
          )}
        />
      )}
      <ButtonRow>
        <Button type="submit" variant="next" busy={sending} busyText="Sending …">
          Send the invitation
        </Button>
        <LinkButton href="/setup/people">Back without inviting</LinkButton>
      </ButtonRow>
    </form>
  );
}
