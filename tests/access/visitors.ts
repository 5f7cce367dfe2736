import { randomUUID } from "node:crypto";
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { inject } from "vitest";
import { demoPerson } from "../support/demo-copy";
import { type CookieJar, signIn } from "../support/sign-in";
import { MATRIX_ROLES, type MatrixRole } from "./matrix.data";

/** Those who hold no session that counts, and how each came to that. */
export const OUTSIDERS = ["nobody", "forged cookie", "suspended", "ended session"] as const;
export type Outsider = (typeof OUTSIDERS)[number];
/** Everybody the walk goes as. */
export const VISITORS = [...OUTSIDERS, "without a role", ...MATRIX_ROLES] as const;
export type Visitor = (typeof VISITORS)[number];

/** Cookie header by visitor. */
export type Cookies = Record<Visitor, string>;

type Sent = { method?: string; body?: unknown; headers?: Record<string, string> };

/** Sends as a page of our own would. */
export function send(cookie: string, where: string, { method = "GET", body, headers = {} }: Sent = {}) {
  const url = inject("serverUrl");
  return fetch(`${url}${where}`, {
    method,
    redirect: "manual",
    headers: {
      ...(cookie === "" ? {} : { cookie }),
      ...(method === "GET" ? {} : { origin: url, "content-type": "application/json" }),
      ...headers,
    },
    ...(method === "GET" ? {} : { body: typeof body === "string" ? body : JSON.stringify(body ?? {}) }),
  });
}

/** Sends what must succeed. @throws Error with the server's words when it does not */
export async function carryOut<T>(cookie: string, where: string, body: unknown, method = "POST"): Promise<T> {
  const answer = await send(cookie, where, { method, body });
  const text = await answer.text();
  if (!answer.ok) throw new Error(`${method} ${where} was refused (${answer.status}): ${text}`);
  return (JSON.parse(text) as { data: T }).data;
}

export const cookieOf = async (role: MatrixRole): Promise<string> =>
  (await signIn(inject("serverUrl"), demoPerson(role))).header();

const PASSWORD = "the tide turns at nine";

/** The invitation as it was posted: the letter's text is quoted-printable, so soft line breaks are joined first. */
async function invitationFor(email: string): Promise<string> {
  const folder = path.join(inject("serverData"), "mail");
  for (let tries = 0; tries < 100; tries += 1) {
    for (const file of readdirSync(folder).reverse()) {
      const letter = readFileSync(path.join(folder, file), "utf8").replaceAll(/=\r?\n/g, "");
      const token = letter.includes(email) && /\/invitation\/([\w-]+)/.exec(letter)?.[1];
      if (token) return token;
    }
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`no invitation was posted to ${email}`);
}

/** Somebody new who comes in as anybody does: invited by an administrator, by the link in the letter, with a password. */
export async function newcomer(
  admin: string,
  name: string,
  roles: readonly MatrixRole[],
): Promise<{ personId: number; jar: CookieJar; email: string; password: string }> {
  const email = `${randomUUID().slice(0, 8)}@corran-sound.example`;
  const { personId } = await carryOut<{ personId: number }>(admin, "/api/v1/people", { name, email, roles });
  await carryOut("", "/api/v1/password/set", { token: await invitationFor(email), password: PASSWORD });
  const jar = await signIn(inject("serverUrl"), { email, password: PASSWORD });
  return { personId, jar, email, password: PASSWORD };
}

/** Ends a session as the sign-out button does. */
export async function signOut(jar: CookieJar): Promise<void> {
  const url = inject("serverUrl");
  const before = jar.header();
  const csrf = await fetch(`${url}/api/auth/csrf`, { headers: { cookie: before } });
  jar.take(csrf);
  const { csrfToken } = (await csrf.json()) as { csrfToken: string };
  await fetch(`${url}/api/auth/signout`, {
    method: "POST",
    redirect: "manual",
    headers: {
      cookie: jar.header(),
      origin: url,
      "content-type": "application/x-www-form-urlencoded",
    },
    body: new URLSearchParams({ csrfToken, callbackUrl: `${url}/`, json: "true" }),
  });
}

/** A session of each role, and of everybody whose session must not count. */
export async function everyVisitor(): Promise<Cookies> {
  const roles = {} as Record<MatrixRole, string>;
  for (const role of MATRIX_ROLES) roles[role] = await cookieOf(role);
  const { admin } = roles;
  const suspended = await newcomer(admin, "Bram Tollard", ["lead"]);
  await carryOut(admin, `/api/v1/people/${suspended.personId}/suspension`, {
    reason: "has left the station",
  });
  const ended = await newcomer(admin, "Wilma Garth", ["lead"]);
  const stale = ended.jar.header();
  await signOut(ended.jar);
  const roleless = await newcomer(admin, "Hanne Quill", ["lead"]);
  await carryOut(admin, `/api/v1/people/${roleless.personId}/roles/end`, {
    role: "lead",
    reason: "moved on",
  });
  return {
    nobody: "",
    "forged cookie": "stillwell-session=eyJhbGciOiJkaXIiLCJlbmMiOiJBMjU2R0NNIn0..AAAA.BBBB.CCCC",
    suspended: suspended.jar.header(),
    "ended session": stale,
    "without a role": roleless.jar.header(),
    ...roles,
  };
}
