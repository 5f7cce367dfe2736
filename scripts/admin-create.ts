import { stdin, stdout } from "node:process";
import { createInterface } from "node:readline/promises";
import { Writable } from "node:stream";
import { text } from "node:stream/consumers";
import { parseArgs } from "node:util";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { Problem } from "@/lib/problem";
import { SYSTEM_ACTOR } from "@/modules/access";
import { migrateDatabase, parseInput, runCommand } from "@/modules/audit";
import { createFirstAdministrator, hashPassword } from "@/modules/identity";
import { firstAdministratorInput } from "@/modules/identity/input";

const USAGE = `Makes the first administrator of this installation.

  npm run admin:create                                     asks for name, e-mail and password
  npm run admin:create -- --name NAME --email ADDRESS      takes the password from standard input
`;

/** Asks at the terminal; what is typed as a password is not shown. */
async function askAtTerminal(given: { name?: string | undefined; email?: string | undefined }) {
  let hidden = false;
  const output = new Writable({
    write(chunk: Buffer, _encoding, done) {
      if (!hidden) stdout.write(chunk);
      done();
    },
  });
  const terminal = createInterface({ input: stdin, output, terminal: true });
  const name = given.name ?? (await terminal.question("Name: "));
  const email = given.email ?? (await terminal.question("E-mail address: "));
  stdout.write("Password (it is not shown): ");
  hidden = true;
  const password = await terminal.question("");
  stdout.write("\nThe same again: ");
  const again = await terminal.question("");
  stdout.write("\n");
  terminal.close();
  if (password !== again) throw new Problem("invalid", "The two passwords differ; nothing was made.");
  return { name, email, password };
}

async function main(): Promise<void> {
  const { values } = parseArgs({
    options: { name: { type: "string" }, email: { type: "string" }, help: { type: "boolean" } },
  });
  if (values.help) {
    console.log(USAGE);
    return;
  }
  const typed = stdin.isTTY
    ? await askAtTerminal(values)
    : { name: values.name, email: values.email, password: (await text(stdin)).replace(/\r?\n$/, "") };
  const { name, email, password } = parseInput(firstAdministratorInput, typed);
  const db = database();
  migrateDatabase(db, systemClock);
  const passwordHash = await hashPassword(password);
  runCommand(
    db,
    SYSTEM_ACTOR,
    createFirstAdministrator,
    { name, email, passwordHash },
    { clock: systemClock },
  );
  db.close();
  console.log(`${name} can sign in at ${settings().STILLWELL_URL}/sign-in as ${email}.`);
}

main().catch((cause: unknown) => {
  if (!(cause instanceof Problem)) throw cause;
  console.error(cause.message);
  for (const error of cause.errors)
    console.error(`  - ${error.pointer.slice(1) || "input"}: ${error.detail}`);
  process.exitCode = 1;
});
