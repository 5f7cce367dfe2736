import { and, asc, eq } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import type { CommandContext } from "@/modules/audit";
import type { SignatureShown } from "./model";
import { signature } from "./schema";

type ToSign = {
  subject: { type: string; id: string | number };
  meaning: string;
  comment?: string | null;
  contentHash: string;
};

/** Puts the actor's name under something, inside a command that is `signed`. Answers the signature's id. */
export function sign(ctx: CommandContext, what: ToSign): number {
  invariant(ctx.actor.personId !== null, "a person signs");
  const row = ctx.db
    .insert(signature)
    .values({
      personId: ctx.actor.personId,
      printedName: ctx.actor.name,
      roles: JSON.stringify(ctx.actor.roles),
      meaning: what.meaning,
      comment: what.comment ?? null,
      signedAt: ctx.at,
      subjectType: what.subject.type,
      subjectId: String(what.subject.id),
      contentHash: what.contentHash,
      entryId: ctx.entryId,
    })
    .returning({ id: signature.id })
    .get();
  return row.id;
}

/** The signatures under something, oldest first, each compared with the hash of what is there now where one is given. */
export function signaturesUnder(
  db: Orm,
  subject: { type: string; id: string | number },
  hashNow: string | null = null,
): SignatureShown[] {
  return db
    .select()
    .from(signature)
    .where(and(eq(signature.subjectType, subject.type), eq(signature.subjectId, String(subject.id))))
    .orderBy(asc(signature.id))
    .all()
    .map(({ roles, subjectType: _type, subjectId: _id, entryId: _entry, ...row }) => ({
      ...row,
      roles: JSON.parse(roles) as string[],
      holds: hashNow === null ? null : hashNow === row.contentHash,
    }));
}
