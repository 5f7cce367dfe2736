import { beforeAll, describe, expect, inject, it } from "vitest";
import { demoPerson } from "../support/demo-copy";
import { CookieJar, signIn } from "../support/sign-in";
import { carryOut, cookieOf, newcomer, send, signOut } from "./visitors";

let admin: string;
beforeAll(async () => {
  admin = await cookieOf("admin");
});

const statusOf = async (cookie: string, where: string): Promise<number> => (await send(cookie, where)).status;

describe("a session", () => {
  it("of somebody who is suspended ends with the very next request, and stays ended when they come back", async () => {
    const one = await newcomer(admin, "Perrin Vale", ["lead"]);
    const cookie = one.jar.header();
    expect(await statusOf(cookie, "/api/v1/systems")).toBe(200);
    expect(await statusOf(cookie, "/systems")).toBe(200);
    await carryOut(admin, `/api/v1/people/${one.personId}/suspension`, { reason: "left the station" });
    expect(await statusOf(cookie, "/api/v1/systems")).toBe(401);
    expect((await send(cookie, "/systems")).headers.get("location")).toMatch(/\/sign-in\?ended=1/);
    await expect(signIn(inject("serverUrl"), one)).rejects.toThrow("refused");
    await carryOut(admin, `/api/v1/people/${one.personId}/reinstatement`, {});
    expect(await statusOf(cookie, "/api/v1/systems")).toBe(401);
    const anew = await signIn(inject("serverUrl"), one);
    expect(await statusOf(anew.header(), "/api/v1/systems")).toBe(200);
  });

  it("gains a role and loses it with the very next request", async () => {
    const one = await newcomer(admin, "Tilda Marsh", ["reader"]);
    const cookie = one.jar.header();
    const grant = (role: string) => carryOut(admin, `/api/v1/people/${one.personId}/roles`, { role });
    const end = (role: string) =>
      carryOut(admin, `/api/v1/people/${one.personId}/roles/end`, { role, reason: "trial is over" });
    expect(await statusOf(cookie, "/history")).toBe(403);
    await grant("auditor");
    expect(await statusOf(cookie, "/history")).toBe(200);
    expect(await statusOf(cookie, "/api/v1/history")).toBe(200);
    await end("auditor");
    expect(await statusOf(cookie, "/history")).toBe(403);
    expect(await statusOf(cookie, "/api/v1/history")).toBe(403);
    await end("reader");
    expect(await statusOf(cookie, "/api/v1/systems")).toBe(403);
    expect(await statusOf(cookie, "/systems")).toBe(403);
  });

  it("is bound to an area with the very next request", async () => {
    const one = await newcomer(admin, "Corin Ash", ["aquarist"]);
    const cookie = one.jar.header();
    const seen = async () =>
      ((await (await send(cookie, "/api/v1/areas")).json()) as { data: { id: number }[] }).data.map(
        ({ id }) => id,
      );
    const all = await seen();
    expect(all.length).toBeGreaterThan(1);
    await carryOut(admin, `/api/v1/people/${one.personId}/areas`, { areaIds: [all[1]] }, "PUT");
    expect(await seen()).toEqual([all[1]]);
  });

  it("that was signed out opens nothing any more, though its cookie is kept", async () => {
    const one = await newcomer(admin, "Edda Finn", ["lead"]);
    const kept = one.jar.header();
    expect(await statusOf(kept, "/api/v1/systems")).toBe(200);
    await signOut(one.jar);
    expect(await statusOf(kept, "/api/v1/systems")).toBe(401);
  });

  it("ends when somebody signs in anew with the same browser", async () => {
    const one = await newcomer(admin, "Lorne Gale", ["lead"]);
    const kept = one.jar.header();
    const url = inject("serverUrl");
    const csrf = await fetch(`${url}/api/auth/csrf`, { headers: { cookie: kept } });
    one.jar.take(csrf);
    const { csrfToken } = (await csrf.json()) as { csrfToken: string };
    const answer = await fetch(`${url}/api/auth/callback/credentials`, {
      method: "POST",
      redirect: "manual",
      headers: { cookie: one.jar.header(), origin: url, "content-type": "application/x-www-form-urlencoded" },
      body: new URLSearchParams({ csrfToken, email: one.email, password: one.password, json: "true" }),
    });
    one.jar.take(answer);
    expect(await statusOf(one.jar.header(), "/api/v1/systems")).toBe(200);
    expect(one.jar.header()).not.toBe(kept);
    expect(await statusOf(kept, "/api/v1/systems")).toBe(401);
  });

  it("is a cookie that scripts do not see and other sites do not send", async () => {
    const url = inject("serverUrl");
    const jar = new CookieJar();
    const csrf = await fetch(`${url}/api/auth/csrf`);
    jar.take(csrf);
    const { csrfToken } = (await csrf.json()) as { csrfToken: string };
    const { email, password } = demoPerson("reader");
    const answer = await fetch(`${url}/api/auth/callback/credentials`, {
      method: "POST",
      redirect: "manual",
      headers: { cookie: jar.header(), origin: url, "content-type": "application/x-www-form-urlencoded" },
      body: new URLSearchParams({ csrfToken, email, password, json: "true" }),
    });
    const set = answer.headers.getSetCookie().find((line) => line.startsWith("stillwell-session=")) ?? "";
    expect(set).toMatch(/;\s*HttpOnly/i);
    expect(set).toMatch(/;\s*SameSite=Lax/i);
    expect(set).toMatch(/;\s*Path=\//i);
    expect(set).not.toMatch(/;\s*Domain=/i);
  });

  it("is not begun without next-auth's own token, nor by a form of another site", async () => {
    const url = inject("serverUrl");
    const { email, password } = demoPerson("reader");
    const answer = await fetch(`${url}/api/auth/callback/credentials`, {
      method: "POST",
      redirect: "manual",
      headers: { "content-type": "application/x-www-form-urlencoded" },
      body: new URLSearchParams({ email, password, json: "true" }),
    });
    expect(answer.headers.getSetCookie().filter((line) => line.startsWith("stillwell-session=ey"))).toEqual(
      [],
    );
  });
});
