import { randomUUID } from "node:crypto";
import path from "node:path";
import Sqlite from "better-sqlite3";
import { type MatrixRow, PAGES } from "../access/matrix.data";
import { type Filling, fill, fillingsOf } from "../access/records";
import { pageAddresses } from "../access/routes";
import type { DemoRole } from "./browser";
import { demoPerson } from "./demo-copy";
import { signIn } from "./sign-in";

/** A page to be looked at: its address, filled from the demonstration, and who looks at it. */
export type Stop = { address: string; path: string; as: DemoRole | null };

/** Who looks: the auditor at the history, the administrator at the setup, the lead at the rest, where they are let in. */
function viewerOf(address: string, { may }: MatrixRow): DemoRole | null {
  if (may === "anybody") return null;
  const first: DemoRole = /^\/history(?:\/|$)/.test(address)
    ? "auditor"
    : /^\/setup(?:\/|$)/.test(address)
      ? "admin"
      : "lead";
  if (may === "signed in" || may.includes(first)) return first;
  return may.includes("lead") ? "lead" : (may[0] ?? null);
}

/**
 * Every page there is in the file system, so that none is passed over.
 * @throws Error for a page that the matrix of access does not know, or whose address it cannot fill
 */
export function everyStop(filling: Filling, links: Readonly<Record<string, string>>): Stop[] {
  return pageAddresses().map((address) => {
    const row = PAGES[address];
    if (row === undefined) throw new Error(`say in tests/access/matrix.data.ts who may see ${address}`);
    const filled = links[address] ?? fill(address, row, filling);
    return { address, path: filled, as: viewerOf(address, row) };
  });
}

/** Records of the demonstration to fill addresses with. */
export function demoFilling(dataFolder: string): Filling {
  const db = new Sqlite(path.join(dataFolder, "stillwell.db"), { readonly: true });
  try {
    const row = db.prepare("select id, code from imports_import order by id limit 1").get() as {
      id: number;
      code: string;
    };
    return fillingsOf(dataFolder, { importId: String(row.id), importCode: row.code }).own;
  } finally {
    db.close();
  }
}

async function secretOf(dataFolder: string, email: string, page: string): Promise<string> {
  const db = new Sqlite(path.join(dataFolder, "stillwell.db"), { readonly: true });
  const letters = db
    .prepare("select body from notifications_mail where to_address = ? order by id desc")
    .pluck();
  try {
    for (let tries = 0; tries < 100; tries += 1) {
      const link = new RegExp(`/${page}/([\\w-]+)`);
      const secret = (letters.all(email) as string[]).map((body) => link.exec(body)?.[1]).find(Boolean);
      if (secret) return secret;
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  } finally {
    db.close();
  }
  throw new Error(`no letter with a link to /${page} went to ${email}`);
}

/** The addresses of letters that count: an invitation and a new password, asked for as a person would. */
export async function letterLinks(url: string, dataFolder: string): Promise<Record<string, string>> {
  const admin = await signIn(url, demoPerson("admin"));
  const post = async (where: string, body: unknown) => {
    const answer = await fetch(`${url}${where}`, {
      method: "POST",
      headers: { cookie: admin.header(), origin: url, "content-type": "application/json" },
      body: JSON.stringify(body),
    });
    if (!answer.ok) throw new Error(`POST ${where} was refused (${answer.status}): ${await answer.text()}`);
  };
  const email = `guest-${randomUUID()}@corran.example`;
  await post("/api/v1/people", { name: "Imre Vauclair", email });
  const forgetful = demoPerson("reader").email;
  await post("/api/v1/password/reset", { email: forgetful });
  return {
    "/invitation/[token]": `/invitation/${await secretOf(dataFolder, email, "invitation")}`,
    "/reset/[token]": `/reset/${await secretOf(dataFolder, forgetful, "reset")}`,
  };
}
