import { beforeAll, describe, expect, inject, it } from "vitest";
import { isLetIn } from "./expected";
import { MATRIX_ROLES, type MatrixRole, type MatrixRow, type Method, PAGES, ROUTES } from "./matrix.data";
import { type Fillings, fill, fillingsOf } from "./records";
import { historyWatch } from "./traces";
import { cookieOf, send } from "./visitors";

const cookies = {} as Record<MatrixRole, string>;
let fillings: Fillings;

beforeAll(async () => {
  for (const role of MATRIX_ROLES) cookies[role] = await cookieOf(role);
  fillings = fillingsOf(inject("serverData"), { importId: "1", importCode: "I26-0001" });
});

type Write = { method: Method; address: string; row: MatrixRow };
const isOurs = (address: string) => address.startsWith("/api/v1/");
const WRITES: Write[] = Object.entries(ROUTES).flatMap(([address, methods]) =>
  Object.entries(methods)
    .filter(([method]) => method !== "GET" && isOurs(address))
    .map(([method, row]) => ({ method: method as Method, address, row })),
);
/** A role that the row lets in, so that a refusal has another ground. */
const letIn = (row: MatrixRow): string => cookies[MATRIX_ROLES.find((role) => isLetIn(row, role)) ?? "lead"];

type ProblemBody = { type?: string };

/** Sends to every write and answers those that were not refused as wanted. */
async function notRefused(
  rows: readonly Write[],
  who: (row: MatrixRow) => string,
  how: { headers: Record<string, string>; body?: string },
  wanted: string,
): Promise<string[]> {
  const history = historyWatch();
  const before = history.newest();
  const wrong: string[] = [];
  for (const { method, address, row } of rows) {
    const answer = await send(who(row), fill(address, row, fillings.own), { method, ...how });
    const { type } = (await answer.json()) as ProblemBody;
    const got = `${answer.status} ${type?.replace("urn:stillwell:problem:", "")}`;
    if (got !== wanted) wrong.push(`${method} ${address}: ${got}`);
  }
  const entries = history.since(before);
  history.close();
  return [...wrong, ...entries.map(({ verb }) => `left ${verb} in the history`)];
}

describe("every write", () => {
  it("is refused when the browser says that another site sends it, also to those who may", async () => {
    for (const headers of [
      { origin: "https://elsewhere.example" },
      { origin: "null" },
      { "sec-fetch-site": "cross-site" },
      { "sec-fetch-site": "same-site" },
    ] as Record<string, string>[]) {
      expect(await notRefused(WRITES, letIn, { headers, body: "{}" }, "403 wrong-origin")).toEqual([]);
    }
    expect(
      await notRefused(
        WRITES,
        () => "",
        { headers: { origin: "https://elsewhere.example" }, body: "{}" },
        "403 wrong-origin",
      ),
    ).toEqual([]);
  });

  it("takes JSON alone, so that no form of another site can send it", async () => {
    const rows = WRITES.filter(({ row }) => row.sends === undefined);
    for (const type of [
      "text/plain",
      "application/x-www-form-urlencoded",
      "multipart/form-data; boundary=x",
      "text/json",
    ]) {
      const how = { headers: { "content-type": type }, body: "a=b" };
      expect(await notRefused(rows, letIn, how, "415 wrong-type")).toEqual([]);
    }
  });

  it("takes a file as a file alone, where it takes one", async () => {
    const rows = WRITES.filter(({ row }) => row.sends === "a file");
    expect(rows).not.toEqual([]);
    for (const type of ["application/json", "multipart/form-data; boundary=x"]) {
      const how = { headers: { "content-type": type }, body: "{}" };
      expect(await notRefused(rows, letIn, how, "415 wrong-type")).toEqual([]);
    }
  });

  it("is refused for what is not JSON after all, or no object", async () => {
    const rows = WRITES.filter(({ row }) => row.sends === undefined);
    for (const body of ["{", "[]", "null", '"text"']) {
      expect(await notRefused(rows, letIn, { headers: {}, body }, "422 invalid")).toEqual([]);
    }
  });

  it("is refused for the role before what was sent is looked at", async () => {
    const rows = WRITES.filter(({ row }) => Array.isArray(row.may) && !isLetIn(row, "reader"));
    const reader = () => cookies.reader;
    expect(rows.length).toBeGreaterThan(50);
    for (const body of ["{", "{}", JSON.stringify({ password: "not mine at all" })]) {
      for (const headers of [{}, { "content-type": "text/plain" }] as Record<string, string>[]) {
        expect(await notRefused(rows, reader, { headers, body }, "403 not-allowed")).toEqual([]);
      }
    }
  });
});

describe("a signature", () => {
  const SIGNED = ["/api/v1/reviews", "/api/v1/limits/workbooks/[workbookId]/decision"];
  const signWith = (cookie: string, address: string, password: string, body: object) =>
    send(cookie, fill(address, {}, fillings.own), { method: "POST", body: { ...body, password } });

  it("asks somebody who may not sign for no password: a wrong one too many is never counted", async () => {
    for (const address of SIGNED) {
      for (let tries = 0; tries < 20; tries += 1) {
        const answer = await signWith(cookies.admin, address, `wrong ${tries}`, { decision: "approve" });
        expect(answer.status).toBe(403);
      }
    }
    const own = await send(cookies.admin, "/api/v1/account/password", {
      method: "POST",
      body: { current: "not this one", password: "a new one, long enough" },
    });
    expect(own.status).toBe(422);
  });

  it("looks at the password after everything else that was sent", async () => {
    for (const address of SIGNED) {
      for (let tries = 0; tries < 20; tries += 1) {
        const answer = await signWith(cookies.lead, address, `wrong ${tries}`, { decision: "perhaps" });
        expect(((await answer.json()) as ProblemBody).type).toBe("urn:stillwell:problem:invalid");
      }
    }
  });

  it("with a wrong password signs nothing", async () => {
    const history = historyWatch();
    const before = history.newest();
    const answer = await signWith(cookies.lead, SIGNED[1] ?? "", "not my password", { decision: "approve" });
    expect(answer.status).toBe(422);
    expect(((await answer.json()) as ProblemBody).type).toBe("urn:stillwell:problem:wrong-password");
    expect(history.since(before)).toEqual([]);
    history.close();
  });
});

describe("a route", () => {
  it("answers 405 to every method that it does not have, to everybody", async () => {
    const wrong: string[] = [];
    for (const [address, methods] of Object.entries(ROUTES)) {
      for (const method of ["GET", "POST", "PUT", "PATCH", "DELETE"] as const) {
        if (methods[method] !== undefined) continue;
        for (const cookie of ["", cookies.admin]) {
          const answer = await send(cookie, fill(address, Object.values(methods)[0] ?? {}, fillings.own), {
            method,
          });
          if (answer.status !== 405) wrong.push(`${method} ${address}: ${answer.status}`);
        }
      }
    }
    expect(wrong).toEqual([]);
  });
});

/** The browser's word that it has the frame around this page and lacks the page alone. */
function frameOf(where: string): string {
  const leaf: unknown = ["__PAGE__", {}, null, "refetch"];
  const parts = where.split("/").filter((part) => part !== "");
  const inner = parts.reduceRight((below: unknown, part) => [part, { children: below }], leaf);
  return encodeURIComponent(JSON.stringify(["", { children: ["(signed-in)", { children: inner }] }]));
}

describe("a page is refused by itself, whatever is said in the name of the proxy:", () => {
  const middleware = Array.from({ length: 8 }, () => "proxy").join(":");
  const FORGED: readonly Record<string, string>[] = [
    { "x-page": "/sign-in" },
    { "x-page": "/" },
    { "x-request-id": "mine", "x-nonce": "mine" },
    { "x-middleware-subrequest": middleware },
    { "x-middleware-subrequest": middleware.replaceAll("proxy", "middleware") },
    { "x-middleware-subrequest": middleware.replaceAll("proxy", "src/middleware") },
    { "x-middleware-override-headers": "x-page", "x-middleware-request-x-page": "/sign-in" },
    { "x-middleware-rewrite": "/systems", "x-middleware-next": "1" },
    { "x-nextjs-data": "1" },
  ];
  const GUARDED = Object.entries(PAGES).filter(([, row]) => row.may !== "anybody");

  it.for(FORGED.map((headers) => ({ headers, name: JSON.stringify(headers).slice(0, 60) })))(
    "$name",
    async ({ headers }) => {
      const wrong: string[] = [];
      for (const [address, row] of GUARDED) {
        const where = fill(address, row, fillings.own);
        const stranger = await send("", where, { headers });
        const text = await stranger.text();
        const to = stranger.headers.get("location") ?? "";
        if (stranger.status !== 307 || !to.includes("/sign-in"))
          wrong.push(`${where} as nobody: ${stranger.status} ${to}`);
        if (text.includes("KELP-02")) wrong.push(`${where} as nobody: shows water`);
        if (isLetIn(row, "reader")) continue;
        const reader = await send(cookies.reader, where, { headers });
        await reader.arrayBuffer();
        if (reader.status !== 403) wrong.push(`${where} as a reader: ${reader.status}`);
      }
      expect(wrong).toEqual([]);
    },
  );

  it("and the parts that the browser asks for alone, as if it had the frame already, hold nothing either", async () => {
    const wrong: string[] = [];
    const [words, letters] = [fillings.foreignWords, "@corran-sound.example"];
    for (const [address, row] of GUARDED) {
      const where = fill(address, row, fillings.own);
      const ways: Record<string, string>[] = [
        {},
        { "next-router-prefetch": "1" },
        { "next-router-state-tree": frameOf(where) },
      ];
      for (const more of ways) {
        for (const cookie of isLetIn(row, "reader") ? [""] : ["", cookies.reader]) {
          const headers: Record<string, string> = { rsc: "1", ...more };
          const first = await send(cookie, where, { headers });
          const to = first.headers.get("location") ?? "";
          const text = await (to.includes("_rsc") ? await send(cookie, to, { headers }) : first).text();
          if (words.some((word) => text.includes(word)) || text.includes(letters)) wrong.push(where);
          // The refusal itself is in it, by the digest that Next gives it.
          if (first.status === 200 && !/NEXT_REDIRECT|;403|sign-in/.test(text))
            wrong.push(`${where} ${text}`);
        }
      }
    }
    // What is looked for is found by somebody who is let in, asked in the same way.
    const rsc: Record<string, string> = { rsc: "1" };
    const first = await send(cookies.lead, "/setup/people", { headers: rsc });
    const shown = await send(cookies.lead, first.headers.get("location") ?? "/setup/people", {
      headers: rsc,
    });
    expect(await shown.text()).toContain(letters);
    expect(wrong).toEqual([]);
  });

  it("and takes no write at all", async () => {
    const history = historyWatch();
    const before = history.newest();
    for (const [address, row] of GUARDED) {
      const where = fill(address, row, fillings.own);
      for (const headers of [{}, { "next-action": "00".repeat(20) }] as Record<string, string>[]) {
        const answer = await send("", where, { method: "POST", body: "[]", headers });
        expect(`${where}: ${answer.status === 200}`).toBe(`${where}: false`);
      }
    }
    expect(history.since(before)).toEqual([]);
    history.close();
  });
});
