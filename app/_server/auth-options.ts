import "server-only";
import { headers } from "next/headers";
import type { NextAuthOptions } from "next-auth";
import Credentials from "next-auth/providers/credentials";
import { database } from "@/db/database";
import { HOUR_MS, SECOND_MS, systemClock } from "@/lib/clock";
import { settings, tellNextAuth } from "@/lib/env";
import { log } from "@/lib/log";
import { runCommand } from "@/modules/audit";
import { endSession, findSession, signIn } from "@/modules/identity";
import { signInInput } from "@/modules/identity/input";
import { SESSION_COOKIE, SESSION_COOKIE_SECURE } from "./cookies";
import { addressOf } from "./request";
import { prepareRuntime } from "./runtime";
import { requestActor } from "./session";

/** Passed to the sign-in page in place of an error's own text. */
export const THROTTLED = "throttled";

class Throttled extends Error {
  constructor() {
    super(THROTTLED);
  }
}

/** Ends the session that a secret belongs to, where it is still open. */
function endSessionOf(secret: unknown): void {
  if (typeof secret !== "string") return;
  const found = findSession(database().reader.orm, secret, systemClock.now());
  if (found.kind === "actor") runCommand(database(), found.actor, endSession, {}, { clock: systemClock });
}

/** The session that this browser still has, whoever's it is, ends when somebody signs in anew. */
async function endFormerSession(): Promise<void> {
  const former = await requestActor().catch(() => null);
  if (former) runCommand(database(), former, endSession, {}, { clock: systemClock });
}

async function authorize(given: Record<string, string> | undefined) {
  try {
    prepareRuntime();
    const credentials = signInInput.safeParse(given);
    if (!credentials.success) return null;
    const address = addressOf(await headers());
    const answer = await signIn(database(), systemClock, { ...credentials.data, address });
    if (answer.kind === "throttled") throw new Throttled();
    if (answer.kind !== "signed-in") return null;
    await endFormerSession();
    return { id: String(answer.personId), sid: answer.secret };
  } catch (cause) {
    if (cause instanceof Throttled) throw cause;
    log().error({ err: cause }, "sign-in failed");
    return null;
  }
}

/**
 * next-auth as it is used here: e-mail and password; the cookie is an encrypted token that carries the session's secret and
 * nothing else. Who the secret belongs to, and whether it still counts, is looked up in the database on every request.
 */
export function authOptions(): NextAuthOptions {
  tellNextAuth();
  const { secureCookies, SESSION_ABSOLUTE_HOURS, NEXTAUTH_SECRET } = settings();
  return {
    secret: NEXTAUTH_SECRET,
    providers: [
      Credentials({ credentials: { email: { type: "email" }, password: { type: "password" } }, authorize }),
    ],
    session: { strategy: "jwt", maxAge: (SESSION_ABSOLUTE_HOURS * HOUR_MS) / SECOND_MS },
    useSecureCookies: secureCookies,
    cookies: {
      sessionToken: {
        name: secureCookies ? SESSION_COOKIE_SECURE : SESSION_COOKIE,
        options: { httpOnly: true, sameSite: "lax", path: "/", secure: secureCookies },
      },
    },
    pages: { signIn: "/sign-in", signOut: "/", error: "/sign-in" },
    callbacks: {
      jwt: ({ token, user }) => ({ sid: (user as { sid?: unknown } | undefined)?.sid ?? token.sid }),
      session({ session, token }) {
        const found =
          typeof token.sid === "string"
            ? findSession(database().reader.orm, token.sid, systemClock.now())
            : { kind: "none" as const };
        return found.kind === "actor"
          ? { expires: session.expires, user: { name: found.actor.name } }
          : { expires: session.expires };
      },
      redirect: ({ url, baseUrl }) => (url.startsWith(`${baseUrl}/`) ? url : baseUrl),
    },
    events: { signOut: ({ token }) => endSessionOf(token?.sid) },
    logger: {
      error: (code, detail) =>
        log().warn({ code, err: detail instanceof Error ? detail : undefined }, "next-auth"),
      warn: (code) => log().info({ code }, "next-auth"),
      debug: () => undefined,
    },
  };
}
