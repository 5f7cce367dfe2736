import { randomUUID } from "node:crypto";
import path from "node:path";
import Sqlite from "better-sqlite3";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { type Filling, type Fillings, fillingsOf } from "./records";
import { historyWatch, refusalsInLog } from "./traces";
import { cookieOf, send } from "./visitors";

let aquarist: string;
let reader: string;
let fillings: Fillings;
let history: ReturnType<typeof historyWatch>;

beforeAll(async () => {
  aquarist = await cookieOf("aquarist");
  reader = await cookieOf("reader");
  fillings = fillingsOf(inject("serverData"), { importId: "1", importCode: "none" });
  history = historyWatch();
});
afterAll(() => history?.close());

const why = "checked at the tank";

/** What an aquarist does at the water, each as it would be sent for the records given. */
const WRITES: readonly {
  what: string;
  method?: string;
  where: (of: Filling) => string;
  body: (of: Filling) => object;
}[] = [
  {
    what: "records readings",
    where: () => "/api/v1/readings",
    body: ({ pointId, parameterId }) => ({
      readings: [
        {
          uuid: randomUUID(),
          pointId: Number(pointId),
          parameterId: Number(parameterId),
          typedText: "12.5",
          takenAt: Date.now() - 60_000,
          confirmed: true,
        },
      ],
    }),
  },
  {
    what: "confirms a reading",
    where: ({ readingId }) => `/api/v1/readings/${readingId}/confirmation`,
    body: () => ({}),
  },
  {
    what: "corrects a reading",
    where: ({ readingId }) => `/api/v1/readings/${readingId}/correction`,
    body: () => ({ uuid: randomUUID(), typedText: "12.4", reason: why, confirmed: true }),
  },
  {
    what: "explains a reading",
    where: ({ readingId }) => `/api/v1/readings/${readingId}/explanation`,
    body: () => ({ text: why }),
  },
  {
    what: "strikes out a reading",
    where: ({ readingId }) => `/api/v1/readings/${readingId}/void`,
    body: () => ({ reason: why }),
  },
  {
    what: "opens an incident about a system",
    where: () => "/api/v1/incidents",
    body: ({ systemId }) => ({ systemId: Number(systemId), title: "Cloudy water" }),
  },
  {
    what: "opens an incident about a reading",
    where: () => "/api/v1/incidents",
    body: ({ readingId }) => ({ readingId: Number(readingId), title: "Too warm" }),
  },
  {
    what: "writes a note on an incident",
    where: ({ incidentId }) => `/api/v1/incidents/${incidentId}/notes`,
    body: () => ({ text: why }),
  },
  {
    what: "sets an incident's owner",
    where: ({ incidentId }) => `/api/v1/incidents/${incidentId}/owner`,
    body: ({ personId }) => ({ ownerId: Number(personId) }),
  },
  {
    what: "asks for a recheck",
    where: ({ incidentId }) => `/api/v1/incidents/${incidentId}/recheck-due`,
    body: () => ({ recheckDueAt: Date.now() + 3_600_000 }),
  },
  {
    what: "joins a reading to an incident",
    where: ({ incidentId }) => `/api/v1/incidents/${incidentId}/readings`,
    body: ({ readingId }) => ({ readingId: Number(readingId) }),
  },
  {
    what: "records a recheck",
    where: ({ incidentId }) => `/api/v1/incidents/${incidentId}/recheck`,
    body: ({ readingId }) => ({ readingId: Number(readingId) }),
  },
  {
    what: "proposes a volume",
    where: () => "/api/v1/volumes",
    body: ({ systemId }) => ({
      systemId: Number(systemId),
      method: "tracer",
      note: "salt, 2 kg, rose by 0.1",
      volume: { text: "20000" },
    }),
  },
  {
    what: "sets a water level",
    where: () => "/api/v1/operating-levels",
    body: ({ systemId }) => ({ systemId: Number(systemId), levelOffset: { text: "-1" }, reason: why }),
  },
];

describe("an aquarist who is bound to areas", () => {
  it.for(WRITES)(
    "never $what of another area, and nothing changes",
    async ({ where, body, method = "POST" }) => {
      const before = history.newest();
      const of = fillings.elsewhere;
      const answer = await send(aquarist, where(of), { method, body: body(of) });
      const text = await answer.text();
      expect([403, 404], text).toContain(answer.status);
      expect(history.since(before)).toEqual([]);
      expect(refusalsInLog()).toContain(answer.headers.get("x-request-id"));
      expect(fillings.foreignWords.filter((word) => text.includes(word))).toEqual([]);
    },
  );

  it("never sends a reading of their own area together with one of another", async () => {
    const before = history.newest();
    const both = [fillings.own, fillings.elsewhere].flatMap((of) => {
      const { readings } = WRITES[0]?.body(of) as { readings: object[] };
      return readings;
    });
    const answer = await send(aquarist, "/api/v1/readings", { method: "POST", body: { readings: both } });
    expect(answer.status).toBe(403);
    expect(history.since(before)).toEqual([]);
  });

  it("does in their own areas what is refused elsewhere", async () => {
    const of = fillings.own;
    for (const what of [
      "records readings",
      "explains a reading",
      "writes a note on an incident",
      "sets a water level",
    ]) {
      const write = WRITES.find((each) => each.what === what);
      const answer = await send(aquarist, write?.where(of) ?? "", { method: "POST", body: write?.body(of) });
      expect(`${what}: ${answer.status} ${answer.ok ? "" : await answer.text()}`).toBe(`${what}: 200 `);
    }
  });

  it("is shown, of limits that were changed for many areas at once, those of their own alone", async () => {
    const db = new Sqlite(path.join(inject("serverData"), "stillwell.db"), { readonly: true });
    const mixed = db
      .prepare(
        `select v.workbook_id from measurements_limit_version v join systems_point p on p.id = v.point_id
         join systems_system s on s.id = p.system_id group by 1 having count(distinct s.area_id) > 3 limit 1`,
      )
      .pluck()
      .get();
    db.close();
    for (const where of [`/api/v1/limits/workbooks/${mixed}`, `/setup/limits/workbooks/${mixed}`]) {
      const answer = await send(aquarist, where);
      const text = await answer.text();
      expect(answer.status).toBe(200);
      expect(text).toContain(fillings.own.systemCode);
      expect(fillings.foreignWords.filter((word) => text.includes(word))).toEqual([]);
      // The words are looked for rightly: somebody who may see every area finds them.
      const all = await (await send(reader, where)).text();
      expect(fillings.foreignWords.filter((word) => all.includes(word))).not.toEqual([]);
    }
  });

  it("finds no list that holds what a reader of all areas finds in it of the others", async () => {
    for (const where of [
      "/api/v1/systems",
      "/api/v1/watch",
      "/api/v1/readings?limit=500",
      "/api/v1/points",
      "/systems",
      "/charts",
    ]) {
      const [own, all] = await Promise.all(
        [aquarist, reader].map(async (cookie) => (await send(cookie, where)).text()),
      );
      const holds = (text = "") => fillings.foreignWords.filter((word) => text.includes(word));
      expect(`${where}: ${holds(all).length > 0} ${holds(own).join()}`).toBe(`${where}: true `);
    }
  });
});
