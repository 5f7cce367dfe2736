import { Readable } from "node:stream";
import type { Database } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { Problem, type ProblemCode } from "@/lib/problem";
import { diskStore, type ReceivedObject, TooLarge } from "@/lib/storage";
import { type Actor, may } from "@/modules/access";
import { parseInput, runCommand } from "@/modules/audit";
import { importsMay } from "./abilities";
import { mustBeNew, registerUpload } from "./commands/register-upload";
import { knownParameters } from "./directory";
import { fileNameInput } from "./input";
import type { FileHeader, FileRefusalCode } from "./model";
import { openReader, type ReaderOptions } from "./reader/open-reader";
import { storageKey } from "./records";
import { RefusedFile } from "./rules/refused-file";

const MB = 1024 * 1024;

export type Upload = {
  /** The name under which the file is brought; its ending must agree with the content. */
  name: string;
  body: ReadableStream<Uint8Array> | AsyncIterable<Uint8Array> | null;
  /** What the sender says about its length. */
  declaredBytes: number | null;
};

export type UploadDeps = {
  db: Database;
  actor: Actor;
  clock: Clock;
  requestId: string | null;
  idempotencyKey?: string | null;
  reader?: ReaderOptions;
};

const CODES: Partial<Record<FileRefusalCode, ProblemCode>> = {
  "too-large": "too-large",
  "wrong-type": "wrong-type",
};

/** A file that cannot be read, as a refusal that leaves the server. */
export function refusedFileProblem({ refusal }: RefusedFile): Problem {
  const detail = `${refusal.reason} ${refusal.mend}`;
  return new Problem(CODES[refusal.code] ?? "invalid", detail, [
    { pointer: "/file", code: refusal.code, detail: refusal.reason },
  ]);
}

function tooLarge(maxBytes: number): Problem {
  const detail = `The file is larger than ${maxBytes / MB} MB. Split it, by month for example.`;
  return new Problem("too-large", detail, [{ pointer: "/file", code: "too-large", detail }]);
}

async function receive({ body, declaredBytes }: Upload): Promise<ReceivedObject> {
  const maxBytes = settings().IMPORT_MAX_MB * MB;
  if (declaredBytes !== null && declaredBytes > maxBytes) throw tooLarge(maxBytes);
  if (body === null) throw new Problem("invalid", "No file was sent. Choose a file first.");
  const from = body instanceof ReadableStream ? Readable.fromWeb(body as never) : body;
  try {
    return await diskStore(settings().dataFolder).receive(from, maxBytes);
  } catch (cause) {
    if (cause instanceof TooLarge) throw tooLarge(maxBytes);
    throw new Problem("invalid", "The file did not arrive whole. Check the network and send it again.", [], {
      cause,
    });
  }
}

/** Looks at the beginning of a file that has arrived. @throws Problem with the sentence of a refusal */
async function inspect(
  db: Database,
  name: string,
  received: ReceivedObject,
  reader: ReaderOptions,
): Promise<FileHeader> {
  try {
    const opened = await openReader(
      {
        path: received.localPath,
        name,
        mode: "survey",
        zone: settings().STILLWELL_ZONE,
        parameters: knownParameters(db.reader.orm),
        defaults: {},
        answers: {},
      },
      reader,
    );
    await opened.close();
    return opened.header;
  } catch (cause) {
    if (cause instanceof RefusedFile) throw refusedFileProblem(cause);
    throw cause;
  }
}

/**
 * Takes a file from the network to the disk without holding it in memory, looks at its beginning, and registers it. A file
 * that is refused leaves nothing behind.
 * @throws Problem `not-allowed`, `too-large`, `wrong-type`, `invalid`, `conflict` (the same file is here already)
 */
export async function receiveUpload(
  deps: UploadDeps,
  upload: Upload,
): Promise<{ importId: number; code: string }> {
  const { db, actor, clock, requestId, idempotencyKey = null, reader = {} } = deps;
  if (!may(actor, importsMay.upload)) {
    throw new Problem("not-allowed", `Your role does not allow you to ${importsMay.upload.says}.`);
  }
  const name = parseInput(fileNameInput, upload.name);
  const received = await receive(upload);
  try {
    // A repeated send of the same act is answered by its key below; without one the same file is refused before it is read.
    if (idempotencyKey === null) mustBeNew(db.reader.orm, received.sha256);
    const header = await inspect(db, name, received, reader);
    await received.keep(storageKey(received.sha256));
    return runCommand(db, actor, registerUpload, { name, header }, { clock, requestId, idempotencyKey })
      .result;
  } finally {
    await received.discard();
  }
}
