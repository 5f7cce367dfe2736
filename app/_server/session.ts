import "server-only";
import { cookies, headers } from "next/headers";
import { forbidden, notFound, redirect } from "next/navigation";
import { decode } from "next-auth/jwt";
import { cache } from "react";
import type { z } from "zod";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { log } from "@/lib/log";
import { Problem } from "@/lib/problem";
import { type Actor, may, type Permission } from "@/modules/access";
import { ask, type Query, upkeep } from "@/modules/audit";
import { findSession, touchSession } from "@/modules/identity";
import { SESSION_COOKIE, SESSION_COOKIE_SECURE } from "./cookies";
import { prepareRuntime } from "./runtime";

async function sessionSecret(): Promise<string | null> {
  const jar = await cookies();
  const name = settings().secureCookies ? SESSION_COOKIE_SECURE : SESSION_COOKIE;
  const token = jar.get(name)?.value;
  if (!token) return null;
  const claims = await decode({ token, secret: settings().NEXTAUTH_SECRET ?? "" });
  return typeof claims?.sid === "string" ? claims.sid : null;
}

/**
 * Who asks, looked up in the database on every request, so that a suspension or a role that ended works at once.
 * Any fault on the way is a refusal.
 * @throws Problem `not-signed-in` or `session-ended`
 */
export async function requestActor(): Promise<Actor> {
  let secret: string | null = null;
  try {
    secret = await sessionSecret();
  } catch (cause) {
    log().warn({ err: cause }, "a session cookie could not be read");
  }
  if (secret === null) throw new Problem("not-signed-in", "Sign in and send it again; nothing was taken.");
  const at = systemClock.now();
  const found = findSession(database().reader.orm, secret, at);
  if (found.kind !== "actor") {
    throw new Problem("session-ended", "Sign in again and send it once more; nothing was taken.");
  }
  const { actor, seenAt } = found;
  if (actor.sessionId) {
    const sessionId = actor.sessionId;
    if (at - seenAt > 60_000) upkeep(database(), (orm) => touchSession(orm, sessionId, seenAt, at));
  }
  return actor;
}

/** The sign-in page, which leads back to where somebody wanted to go. */
async function signInAddress(cause: Problem): Promise<string> {
  const page = (await headers()).get("x-page") ?? "/";
  const search = new URLSearchParams();
  if (cause.code === "session-ended") search.set("ended", "1");
  if (page !== "/") search.set("to", page);
  return search.size > 0 ? `/sign-in?${search}` : "/sign-in";
}

/** Every page that is refused leaves a line, by the id that its answer carries (set by proxy.ts, which decides nothing). */
async function noteRefusal(why: Record<string, unknown>): Promise<void> {
  const asked = await headers();
  log().info({ requestId: asked.get("x-request-id"), path: asked.get("x-page"), ...why }, "page refused");
}

/** The actor of a page, once a request; people who are not signed in are sent to the sign-in page. */
export const pageActor = cache(async (): Promise<Actor> => {
  prepareRuntime();
  try {
    return await requestActor();
  } catch (cause) {
    if (!(cause instanceof Problem && cause.status === 401)) throw cause;
    await noteRefusal({ person: null, code: cause.code });
    redirect(await signInAddress(cause));
  }
});

/** Shows the page that says that this is not for the actor. */
export async function refusePage(actor: Actor, permission: Permission): Promise<never> {
  await noteRefusal({ person: actor.personId, permission: permission.code, code: "not-allowed" });
  forbidden();
}

/** Shows the page that says that there is no such record, or none that the actor may see. */
export async function noSuchRecord(actor: Actor, what: string): Promise<never> {
  await noteRefusal({ person: actor.personId, what, code: "not-found" });
  notFound();
}

/** A page that needs a permission before it asks anything (a form); shows the page that says so where there is none. */
export async function mustMay(permission: Permission): Promise<Actor> {
  const actor = await pageActor();
  return may(actor, permission) ? actor : refusePage(actor, permission);
}

/** Asks a question for a page: not allowed shows the page that says so, not found the one that says that. */
export async function askPage<S extends z.ZodType, R>(what: Query<S, R>, input: z.input<S>): Promise<R> {
  const actor = await pageActor();
  try {
    return ask({ db: database().reader.orm, actor, at: systemClock.now() }, what, input);
  } catch (cause) {
    if (!(cause instanceof Problem)) throw cause;
    await noteRefusal({ person: actor.personId, query: what.name, code: cause.code });
    if (cause.status === 403) forbidden();
    if (cause.status === 404 || cause.status === 422) notFound();
    throw cause;
  }
}
