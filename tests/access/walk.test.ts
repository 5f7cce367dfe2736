import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { expectedStatus, isLetIn, type Kind } from "./expected";
import { importedFile } from "./imported-file";
import { MATRIX_ROLES, type MatrixRow, type Method, PAGES, ROUTES } from "./matrix.data";
import { type Filling, type Fillings, fill, fillingsOf, isOfAnArea, isRecord, kindsIn } from "./records";
import { addressOf, methodsOf, pageAddresses, routeMethods } from "./routes";
import { historyWatch, refusalsInLog } from "./traces";
import { type Cookies, everyVisitor, send, VISITORS, type Visitor } from "./visitors";

/** A field that no schema knows: whoever is let in is told so, and nothing is carried out. */
const PROBE = { "a field of no form": true };

const ELSEWHERE = " of other areas";

let cookies: Cookies;
let fillings: Fillings;
let history: ReturnType<typeof historyWatch>;
/** Ids of the requests that were refused, each of which must be a line of the log. */
const refused = new Map<string, string>();

beforeAll(async () => {
  cookies = await everyVisitor();
  fillings = fillingsOf(inject("serverData"), await importedFile(cookies.analyst));
  history = historyWatch();
});
afterAll(() => history?.close());

type Asked = { kind: Kind; method: Method; address: string; row: MatrixRow };

function ask(visitor: Visitor, { method, address, row }: Asked, filling: Filling): Promise<Response> {
  const where = fill(address, row, filling);
  if (method === "GET") return send(cookies[visitor], where);
  const isFile = row.sends === "a file";
  return send(cookies[visitor], where, {
    method,
    body: isFile ? "system;parameter" : PROBE,
    ...(isFile ? { headers: { "content-type": "application/octet-stream" } } : {}),
  });
}

/** Notes a refusal's id, so that the log can be asked about it. */
function note(response: Response, what: string): void {
  refused.set(response.headers.get("x-request-id") ?? `no id: ${what}`, what);
}

/** Asks once and answers what is wrong with the answer; null where it is as expected. */
async function fault(
  visitor: Visitor,
  asked: Asked,
  filling: Filling,
  wanted: number,
  as = "",
): Promise<string | null> {
  const response = await ask(visitor, asked, filling);
  const text = await response.text();
  const who = `${visitor}${as}`;
  const what = `${who}: ${asked.method} ${fill(asked.address, asked.row, filling)}`;
  if (response.status !== wanted)
    return `${who} got ${response.status}, not ${wanted}: ${text.slice(0, 200)}`;
  // A record that nobody has is no refusal; one that is kept from somebody is.
  if (!isLetIn(asked.row, visitor) || (as === ELSEWHERE && wanted !== 200)) note(response, what);
  if (wanted === 307 && !isLetIn(asked.row, visitor)) {
    const to = response.headers.get("location") ?? "nowhere";
    if (!/^(?:http:\/\/[^/]+)?\/sign-in(?:\?|$)/.test(to)) return `${who} was sent to ${to}`;
  }
  const shows =
    visitor === "aquarist" ? fillings.foreignWords.filter((word) => shown(text, word, filling)) : [];
  return shows.length > 0 ? `${who} was shown something of another area: ${shows.join(", ")}` : null;
}

/** A page repeats its own address; what else it says of another area's water is a leak. */
const shown = (text: string, word: string, filling: Filling): boolean =>
  text.includes(word) && word !== filling.systemCode;

async function mustBeAsExpected(asked: Asked): Promise<void> {
  const { kind, address, row } = asked;
  const before = history.newest();
  const faults: (string | null)[] = [];
  for (const visitor of VISITORS) {
    faults.push(await fault(visitor, asked, fillings.own, expectedStatus(kind, row, visitor)));
  }
  if (kind !== "write") {
    const named = kindsIn(address, row);
    if (named.some(isOfAnArea) && isLetIn(row, "aquarist")) {
      const wanted = row.elsewhere ?? 404;
      faults.push(await fault("aquarist", asked, fillings.elsewhere, wanted, ELSEWHERE));
    }
    if (named.some(isRecord)) {
      for (const visitor of MATRIX_ROLES) {
        const usual = expectedStatus(kind, row, visitor);
        const wanted = isLetIn(row, visitor) ? (row.missing ?? 404) : usual;
        faults.push(await fault(visitor, asked, fillings.missing, wanted, " asking for what does not exist"));
      }
    }
  }
  expect(faults.filter((each) => each !== null)).toEqual([]);
  expect(history.since(before)).toEqual([]);
}

describe("the walk", () => {
  it("finds the methods of a route however they are exported, and passes over none", () => {
    expect(methodsOf("export const GET = query(a);\nexport const POST = command(b);")).toEqual([
      "GET",
      "POST",
    ]);
    expect(methodsOf("export async function DELETE() {}")).toEqual(["DELETE"]);
    expect(methodsOf("export { handle as GET, handle as PUT };")).toEqual(["GET", "PUT"]);
    expect(() => methodsOf('export * from "./elsewhere";')).toThrow("by name");
    expect(() => methodsOf("export const { GET, POST } = both;")).toThrow("by name");
    expect(() => methodsOf("const GET = 1;")).toThrow("without a method");
  });

  it("knows an address by its file, groups left out", () => {
    expect(addressOf("(signed-in)/systems/[code]/page.tsx")).toBe("/systems/[code]");
    expect(addressOf("page.tsx")).toBe("/");
  });
});

describe("the matrix", () => {
  it("has a row for every page, and no other", () => {
    expect(Object.keys(PAGES).sort()).toEqual(pageAddresses().sort());
  });

  it("has a row for every method of every route, and no other", () => {
    const have = Object.entries(ROUTES).flatMap(([address, methods]) =>
      Object.keys(methods).map((method) => `${method} ${address}`),
    );
    const are = [...routeMethods()].flatMap(([address, methods]) =>
      methods.map((method) => `${method} ${address}`),
    );
    expect(have.sort()).toEqual(are.sort());
  });
});

describe("a page answers each role as the matrix says, and changes nothing:", () => {
  it.for(Object.entries(PAGES))("%s", async ([address, row]) => {
    await mustBeAsExpected({ kind: "page", method: "GET", address, row });
  });
});

describe("a route answers each role as the matrix says, and changes nothing:", () => {
  const rows = Object.entries(ROUTES).flatMap(([address, methods]) =>
    Object.entries(methods).map(([method, row]) => ({ method: method as Method, address, row })),
  );
  it.for(rows)("$method $address", async ({ method, address, row }) => {
    await mustBeAsExpected({ kind: method === "GET" ? "read" : "write", method, address, row });
  });
});

describe("every refusal of the walk", () => {
  it("is a line of the log under the id that its answer carries", () => {
    expect(refused.size).toBeGreaterThan(100);
    const told = refusalsInLog();
    expect([...refused].filter(([id]) => !told.has(id)).map(([id, what]) => `${what} (${id})`)).toEqual([]);
  });
});
