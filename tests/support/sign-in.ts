/** The cookies of one visitor, kept between requests as a browser would. */
export class CookieJar {
  readonly #cookies = new Map<string, string>();

  /** Takes what a response sets; an empty or expired value is forgotten. */
  take(response: Response): void {
    for (const line of response.headers.getSetCookie()) {
      const [pair = "", ...attributes] = line.split(";");
      const at = pair.indexOf("=");
      const name = pair.slice(0, at).trim();
      const value = pair.slice(at + 1).trim();
      const isGone = attributes.some((attribute) => /^\s*max-age=0\s*$/i.test(attribute)) || value === "";
      if (isGone) this.#cookies.delete(name);
      else this.#cookies.set(name, value);
    }
  }

  /** The value of the Cookie header. */
  header(): string {
    return [...this.#cookies].map(([name, value]) => `${name}=${value}`).join("; ");
  }

  entries(): [name: string, value: string][] {
    return [...this.#cookies];
  }
}

/**
 * Signs in over HTTP as the sign-in page does, and answers the cookies of the session.
 * @throws Error when the server refuses
 */
export async function signIn(url: string, person: { email: string; password: string }): Promise<CookieJar> {
  const jar = new CookieJar();
  const csrf = await fetch(`${url}/api/auth/csrf`);
  jar.take(csrf);
  const { csrfToken } = (await csrf.json()) as { csrfToken: string };
  const answer = await fetch(`${url}/api/auth/callback/credentials`, {
    method: "POST",
    redirect: "manual",
    headers: { cookie: jar.header(), "content-type": "application/x-www-form-urlencoded", origin: url },
    body: new URLSearchParams({
      csrfToken,
      email: person.email,
      password: person.password,
      callbackUrl: `${url}/`,
      json: "true",
    }),
  });
  jar.take(answer);
  const session = await fetch(`${url}/api/auth/session`, { headers: { cookie: jar.header() } });
  const body = (await session.json()) as { user?: unknown } | null;
  if (!answer.ok || !body?.user)
    throw new Error(`signing in as ${person.email} was refused (${answer.status})`);
  return jar;
}
