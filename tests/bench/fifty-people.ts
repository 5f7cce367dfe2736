/**
 * Fifty people submitting readings, one after the other each, for a bounded number of requests; beside it in the same run
 * a route of the same server that writes nothing and a bare better-sqlite3 insert, so that ratios can be read on any machine.
 * Needs a build: `npm run build`, then `npx tsx --conditions=react-server tests/bench/fifty-people.ts`. Loopback only.
 */
import { randomUUID } from "node:crypto";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import BetterSqlite3 from "better-sqlite3";
import { demoPerson } from "../support/demo-copy";
import { signIn } from "../support/sign-in";
import { startTestServer } from "../support/test-server";

const PEOPLE = 50;
const EACH = 40;

type Outcome = { name: string; perSecond: number; p50: number; p95: number; failures: number };

/** Fifty at once, each waiting for an answer before the next request. */
async function load(
  name: string,
  send: (person: number, turn: number) => Promise<boolean>,
): Promise<Outcome> {
  const times: number[] = [];
  let failures = 0;
  const begun = performance.now();
  await Promise.all(
    Array.from({ length: PEOPLE }, async (_each, person) => {
      for (let turn = 0; turn < EACH; turn += 1) {
        const sent = performance.now();
        if (!(await send(person, turn))) failures += 1;
        times.push(performance.now() - sent);
      }
    }),
  );
  const seconds = (performance.now() - begun) / 1000;
  times.sort((a, b) => a - b);
  const at = (share: number) => times[Math.floor(share * (times.length - 1))] ?? Number.NaN;
  return { name, perSecond: times.length / seconds, p50: at(0.5), p95: at(0.95), failures };
}

/** The same number of durable inserts with nothing around them. */
function bareInserts(): Outcome {
  const folder = mkdtempSync(path.join(tmpdir(), "stillwell-bare-"));
  const sqlite = new BetterSqlite3(path.join(folder, "bare.db"));
  sqlite.pragma("journal_mode = WAL");
  sqlite.pragma("synchronous = FULL");
  sqlite.exec(
    "create table reading (id integer primary key, uuid text unique, point integer, value real, taken_at integer)",
  );
  const insert = sqlite.prepare("insert into reading (uuid, point, value, taken_at) values (?, ?, ?, ?)");
  const times: number[] = [];
  const begun = performance.now();
  for (let turn = 0; turn < PEOPLE * EACH; turn += 1) {
    const sent = performance.now();
    insert.run(randomUUID(), 1, 13.4, Date.now());
    times.push(performance.now() - sent);
  }
  const seconds = (performance.now() - begun) / 1000;
  sqlite.close();
  rmSync(folder, { recursive: true });
  times.sort((a, b) => a - b);
  const at = (share: number) => times[Math.floor(share * (times.length - 1))] ?? Number.NaN;
  return {
    name: "bare better-sqlite3 insert",
    perSecond: times.length / seconds,
    p50: at(0.5),
    p95: at(0.95),
    failures: 0,
  };
}

type Watch = { pointId: number; parameter: { id: number; code: string } };

type Served = { url: string; headers: Record<string, string> };

/** The lightest route of the same server: who asks is looked up, nothing is written. */
async function askedWho({ url, headers }: Served): Promise<Outcome> {
  return load("a route handler that writes nothing (who am I)", async () => {
    const answer = await fetch(`${url}/api/v1/session`, { headers });
    await answer.json();
    return answer.ok;
  });
}

async function submitted({ url, headers }: Served): Promise<Outcome> {
  const answer = await fetch(`${url}/api/v1/watch`, { headers });
  const { data } = (await answer.json()) as { data: Watch[] };
  const rows = data.filter((row) => row.parameter.code === "temperature");
  return load("a reading submitted (sign-in checked, judged, sealed, durable)", async (person, turn) => {
    const row = rows[(person + turn) % rows.length];
    const uuid = randomUUID();
    const reading = {
      uuid,
      pointId: row?.pointId,
      parameterId: row?.parameter.id,
      typedText: "13.4",
      takenAt: Date.now(),
    };
    const sent = await fetch(`${url}/api/v1/readings`, {
      method: "POST",
      headers: { ...headers, "idempotency-key": uuid },
      body: JSON.stringify({ readings: [reading] }),
    });
    await sent.json();
    return sent.ok;
  });
}

async function served(): Promise<Outcome[]> {
  const server = await startTestServer("bench");
  try {
    const jar = await signIn(server.url, demoPerson("operator"));
    const headers = { cookie: jar.header(), "content-type": "application/json", origin: server.url };
    const to = { url: server.url, headers };
    return [await askedWho(to), await submitted(to)];
  } finally {
    await server.stop();
  }
}

const outcomes = [bareInserts(), ...(await served())];
const product = outcomes[2];
for (const each of outcomes) {
  const ratio = product ? each.perSecond / product.perSecond : Number.NaN;
  console.log(
    `${each.name}: ${each.perSecond.toFixed(0)}/s, p50 ${each.p50.toFixed(2)} ms, p95 ${each.p95.toFixed(2)} ms, ` +
      `${each.failures} failures, ${ratio.toFixed(2)} × a submitted reading`,
  );
}
