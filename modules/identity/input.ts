import { z } from "zod";
import { ROLES } from "@/modules/access/model";
import { PASSWORD_MAX_LENGTH, PASSWORD_MIN_LENGTH } from "./model";

const name = z
  .string()
  .trim()
  .min(2, "Write the person's name.")
  .max(80, "Keep the name under 80 characters.");
const email = z.email("Write an e-mail address such as name@example.org.").max(200);
const role = z.enum(ROLES);
const id = z.coerce.number().int().positive();
const day = z.iso.date("Write a day such as 2026-03-01.");

/** A password that a person chooses: length is what counts (NIST SP 800-63B, 5.1.1.2). */
export const newPassword = z
  .string()
  .min(
    PASSWORD_MIN_LENGTH,
    `Use at least ${PASSWORD_MIN_LENGTH} characters; a few words make a good password.`,
  )
  .max(PASSWORD_MAX_LENGTH, `Use at most ${PASSWORD_MAX_LENGTH} characters.`)
  .refine((text) => new Set(text).size >= 5, "Use at least five different characters.");

/** What the command line asks for before there is anybody. */
export const firstAdministratorInput = z.strictObject({
  name: z.string("Give a name: --name.").pipe(name),
  email: z.string("Give an e-mail address: --email.").pipe(email),
  password: newPassword,
});

export const invitePersonInput = z.strictObject({
  name,
  email,
  roles: z.array(role).max(ROLES.length).default([]),
  areaIds: z.array(id).max(200).default([]),
});

export const editPersonInput = z.strictObject({ personId: id, name, email });

export const grantRoleInput = z.strictObject({ personId: id, role });
export const decideRoleInput = z.strictObject({ grantId: id, decision: z.enum(["approve", "refuse"]) });
export const endRoleInput = z.strictObject({
  personId: id,
  role,
  reason: z.string().trim().min(3, "Say why.").max(300),
});

export const bindAreasInput = z.strictObject({
  personId: id,
  areaIds: z.array(id).max(200),
});

export const suspendPersonInput = z.strictObject({
  personId: id,
  reason: z.string().trim().min(3, "Say why.").max(300),
});
export const reinstatePersonInput = z.strictObject({ personId: id });

export const nameDeputyInput = z
  .strictObject({ personId: id, deputyId: id, role, fromOn: day, toOn: day })
  .refine((input) => input.fromOn <= input.toOn, {
    message: "The last day is before the first.",
    path: ["toOn"],
  })
  .refine((input) => input.personId !== input.deputyId, {
    message: "Name somebody else.",
    path: ["deputyId"],
  });
export const endDeputyInput = z.strictObject({ deputyshipId: id });

export const signInInput = z.object({
  email: z.string().min(1).max(200),
  password: z.string().min(1).max(PASSWORD_MAX_LENGTH),
});
export const requestResetInput = z.strictObject({ email });
export const setPasswordInput = z.strictObject({ token: z.string().min(20).max(200), password: newPassword });
export const changePasswordInput = z.strictObject({
  current: z.string().min(1).max(PASSWORD_MAX_LENGTH),
  password: newPassword,
});
export const preferUnitsInput = z.strictObject({ units: z.record(z.string().max(40), z.string().max(40)) });
