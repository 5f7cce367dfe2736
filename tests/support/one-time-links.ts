import { desc, eq } from "drizzle-orm";
import { SYSTEM_ACTOR } from "@/modules/access";
import { createFirstAdministrator, hashPassword } from "@/modules/identity";
import { mail } from "@/modules/notifications/schema";
import type { TestBench } from "./database";

export const PASSWORD = "tide pool lantern nine";

/** The secret in the newest letter to an address, as the person would follow it. */
export function secretInMail(bench: TestBench, email: string): string {
  const letter = bench.db.reader.orm
    .select()
    .from(mail)
    .where(eq(mail.toAddress, email))
    .orderBy(desc(mail.id))
    .get();
  const secret = /\/(?:invitation|reset)\/([\w-]+)/.exec(letter?.body ?? "")?.[1];
  if (!secret) throw new Error(`no letter with a link went to ${email}`);
  return secret;
}

/** An administrator who can sign in with PASSWORD. */
export async function administrator(bench: TestBench, email = "mara@corran.example"): Promise<number> {
  const passwordHash = await hashPassword(PASSWORD);
  return bench.run(SYSTEM_ACTOR, createFirstAdministrator, { name: "Mara Quill", email, passwordHash })
    .personId;
}
