import { NextRequest } from "next/server";
import { beforeEach, describe, expect, it } from "vitest";
import { authOptions } from "@/app/_server/auth-options";
import { mustComeFromHere } from "@/app/_server/request";
import { readSettings, useSettings } from "@/lib/env";
import { config, proxy } from "@/proxy";

const SECRET = "q8Zt0mWv3nXk5pLr7sYb2dFg4hJc6aEu";

const serveAt = (url: string) =>
  useSettings(
    readSettings({
      NODE_ENV: "production",
      LOG_LEVEL: "silent",
      STILLWELL_URL: url,
      NEXTAUTH_SECRET: SECRET,
    }),
  );
const page = (path = "/setup") => proxy(new NextRequest(`https://water.corran.example${path}`));
const rulesOf = (response: Response) =>
  new Map(
    (response.headers.get("content-security-policy") ?? "").split("; ").map((rule) => {
      const [name = "", ...values] = rule.split(" ");
      return [name, values] as const;
    }),
  );

beforeEach(() => serveAt("https://water.corran.example"));

describe("the session cookie", () => {
  it("over https says by its name that it is of this host alone, and is kept from scripts and other sites", () => {
    const { cookies, useSecureCookies, session } = authOptions();
    expect(cookies?.sessionToken).toEqual({
      name: "__Host-stillwell-session",
      options: { httpOnly: true, sameSite: "lax", path: "/", secure: true },
    });
    expect(useSecureCookies).toBe(true);
    expect(session?.maxAge).toBe(168 * 3600);
  });

  it("without https, on this machine alone, has another name", () => {
    serveAt("http://localhost:3000");
    expect(authOptions().cookies?.sessionToken?.name).toBe("stillwell-session");
  });

  it("carries the session's secret and nothing else", async () => {
    const jwt = authOptions().callbacks?.jwt;
    const given = {
      token: { name: "Joe", email: "joe@corran.example", sub: "7" },
      user: { id: "7", sid: "s3" },
    };
    expect(await jwt?.({ ...given, account: null } as never)).toEqual({ sid: "s3" });
    expect(await jwt?.({ token: { sid: "s3", iat: 1, more: "x" } } as never)).toEqual({ sid: "s3" });
  });

  it("is never followed by a way to another site", async () => {
    const redirect = authOptions().callbacks?.redirect;
    const baseUrl = "https://water.corran.example";
    expect(await redirect?.({ url: `${baseUrl}/setup`, baseUrl })).toBe(`${baseUrl}/setup`);
    for (const url of [
      "https://elsewhere.example/",
      `${baseUrl}.elsewhere.example/`,
      "//elsewhere.example",
    ]) {
      expect(await redirect?.({ url, baseUrl })).toBe(baseUrl);
    }
  });
});

describe("a page", () => {
  it("runs scripts and style sheets by a nonce of its own alone", () => {
    const [first, second] = [rulesOf(page()), rulesOf(page())];
    const scripts = first.get("script-src") ?? [];
    expect(scripts.filter((one) => one.startsWith("'nonce-"))).toHaveLength(1);
    expect(scripts).not.toContain("'unsafe-inline'");
    expect(scripts).not.toContain("'unsafe-eval'");
    expect(first.get("style-src")).not.toContain("'unsafe-inline'");
    expect(second.get("script-src")).not.toEqual(scripts);
    for (const name of ["object-src", "base-uri", "frame-ancestors"])
      expect(first.get(name)).toEqual(["'none'"]);
  });

  it("over https is asked for by https from then on; without it no such promise is made", () => {
    expect(page().headers.get("strict-transport-security")).toBe("max-age=31536000");
    serveAt("http://localhost:3000");
    expect(page().headers.get("strict-transport-security")).toBeNull();
  });

  it("is never refused or let through by the proxy, whoever asks", () => {
    for (const path of ["/", "/setup/people", "/sign-in"]) {
      const response = page(path);
      expect(response.status).toBe(200);
      expect(response.headers.get("x-middleware-next")).toBe("1");
    }
  });

  it("goes through the proxy; what is sent to the interface does not, so that no upload is cut", () => {
    const matches = (path: string) => new RegExp(`^${config.matcher[0]}$`).test(path);
    expect(["/", "/setup", "/sign-in", "/apiary"].map(matches)).toEqual([true, true, true, true]);
    expect(["/api/v1/imports", "/_next/static/x.js"].map(matches)).toEqual([false, false]);
  });
});

describe("a write from another site", () => {
  const send = (headers: Record<string, string>) =>
    mustComeFromHere(new Request("https://water.corran.example/api/v1/people", { method: "POST", headers }));

  it("is refused by its origin and by what the browser says of it", () => {
    for (const headers of [
      { origin: "https://elsewhere.example" },
      { origin: "null" },
      { "sec-fetch-site": "cross-site" },
      { "sec-fetch-site": "same-site", origin: "https://water.corran.example" },
    ] as Record<string, string>[]) {
      expect(() => send(headers)).toThrow("this site's own pages");
    }
  });

  it("is told from one of our own", () => {
    send({ origin: "https://water.corran.example", "sec-fetch-site": "same-origin" });
  });
});
