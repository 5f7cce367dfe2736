import { type ChildProcess, fork } from "node:child_process";
import path from "node:path";
import { invariant } from "@/lib/invariant";
import type { FileHeader, FileRefusal } from "@/modules/imports/model";
import type {
  FromReader,
  ReaderBatch,
  ReaderReport,
  ReaderRequest,
  ToReader,
} from "@/modules/imports/reader/messages";
import { type RefusedFile, refuseFile } from "@/modules/imports/rules/refused-file";

export type ReaderOptions = {
  /** Ends the reading; the iterator then throws a refusal with the code `stopped`. */
  signal?: AbortSignal;
  /** The bundled reading process. */
  script?: string;
  /** Memory of the reading process, MB. */
  heapMb?: number;
  /** The longest one answer may take, ms. */
  answerMs?: number;
  /** The longest all answers together may take, ms. */
  totalMs?: number;
};

/** A file opened in a process of its own. `close` must be called, or the batches read to their end. */
export type OpenedFile = {
  header: FileHeader;
  /** Batches in the order of the file. The next one is asked for only when the one before has been taken. */
  batches: AsyncGenerator<ReaderBatch, void, undefined>;
  /** What the whole reading showed; after the last batch. */
  report: () => ReaderReport;
  close: () => Promise<void>;
};

const DEFAULTS = { heapMb: 384, answerMs: 60_000, totalMs: 600_000 } as const;

/** Where `node scripts/build-reader.mjs` puts the reading process. */
export const readerScript = (): string =>
  path.join(/* turbopackIgnore: true */ process.cwd(), "build", "reader-process.mjs");

const refusal = (code: FileRefusal["code"], reason: string, mend: string): RefusedFile =>
  refuseFile(code, reason, mend);

const outOfMemory = () =>
  refusal(
    "out-of-memory",
    "Reading the file takes more memory than is allowed, so it was stopped.",
    "Split the file, by month for example, or save the table as CSV.",
  );
const tookTooLong = () =>
  refusal(
    "took-too-long",
    "Reading the file takes longer than is allowed, so it was stopped.",
    "Split the file, by month for example, or save the table as CSV.",
  );
const stopped = () =>
  refusal("stopped", "The reading of the file was stopped.", "Start it again when it is wanted.");

/** The reading process seen from outside: one question at a time, each answered, refused, or ended by a limit. */
class ReaderHandle {
  readonly #child: ChildProcess;
  readonly #answerMs: number;
  readonly #exited: Promise<void>;
  #leftMs: number;
  #ended: Error | null = null;
  #settle: { resolve: (message: FromReader) => void; reject: (error: Error) => void } | null = null;
  #stderr = "";

  constructor(options: ReaderOptions) {
    this.#answerMs = options.answerMs ?? DEFAULTS.answerMs;
    this.#leftMs = options.totalMs ?? DEFAULTS.totalMs;
    this.#child = fork(options.script ?? readerScript(), [], {
      execArgv: [`--max-old-space-size=${options.heapMb ?? DEFAULTS.heapMb}`, "--max-semi-space-size=16"],
      env: { NODE_ENV: "production" },
      stdio: ["ignore", "ignore", "pipe", "ipc"],
    });
    this.#child.stderr?.on("data", (data: Buffer) => {
      this.#stderr = (this.#stderr + data.toString()).slice(-4000);
    });
    this.#child.on("message", (message) => this.#answered(message as FromReader));
    this.#exited = new Promise((resolve) => {
      this.#child.on("exit", (code, signal) => {
        this.#fail(this.#exitError(code, signal));
        resolve();
      });
      this.#child.on("error", (cause) => {
        this.#fail(new Error("The reading process could not be started", { cause }));
        resolve();
      });
    });
  }

  /** Sends a question and waits for its answer. @throws RefusedFile */
  ask(message: ToReader): Promise<FromReader> {
    if (this.#ended) return Promise.reject(this.#ended);
    invariant(this.#settle === null, "the reading process is asked one thing at a time");
    const started = performance.now();
    const timer = setTimeout(
      () => this.kill(tookTooLong()),
      Math.max(1, Math.min(this.#answerMs, this.#leftMs)),
    );
    const answer = new Promise<FromReader>((resolve, reject) => {
      this.#settle = { resolve, reject };
      this.#child.send(message, (error) => {
        if (error) this.#fail(this.#ended ?? error);
      });
    });
    return answer.finally(() => {
      clearTimeout(timer);
      this.#leftMs -= performance.now() - started;
    });
  }

  /** Ends the process; what is still waited for is refused with `error`. */
  kill(error: Error): void {
    this.#fail(error);
    this.#child.kill("SIGKILL");
  }

  async close(): Promise<void> {
    this.kill(stopped());
    await this.#exited;
  }

  #answered(message: FromReader): void {
    const waiting = this.#settle;
    this.#settle = null;
    if (message.kind === "refused") {
      const { code, reason, mend, line } = message.refusal;
      waiting?.reject(refuseFile(code, reason, mend, line));
    } else if (message.kind === "failed") {
      waiting?.reject(failed(message.detail));
    } else {
      waiting?.resolve(message);
    }
  }

  #fail(error: Error): void {
    this.#ended ??= error;
    this.#settle?.reject(this.#ended);
    this.#settle = null;
  }

  #exitError(code: number | null, signal: NodeJS.Signals | null): Error {
    const isOutOfMemory =
      signal === "SIGABRT" || signal === "SIGKILL" || code === 134 || /heap out of memory/.test(this.#stderr);
    return isOutOfMemory ? outOfMemory() : failed(`ended with ${signal ?? code}: ${this.#stderr}`);
  }
}

/** A fault of ours: the person gets a sentence, the log gets the cause. */
function failed(detail: string): RefusedFile {
  const error = refusal(
    "reader-failed",
    "The file could not be read because of a fault in the program.",
    "Try again; if it happens again, tell the administrator at which time it happened.",
  );
  error.cause = new Error(detail);
  return error;
}

/**
 * Opens a file of readings in a process of its own with limited memory and time, and returns what its beginning
 * shows. Nothing of the file is held here but the batch in hand.
 * @throws RefusedFile with a sentence for every reason not to read the file
 */
export async function openReader(request: ReaderRequest, options: ReaderOptions = {}): Promise<OpenedFile> {
  if (options.signal?.aborted) throw stopped();
  const handle = new ReaderHandle(options);
  const onAbort = () => handle.kill(stopped());
  options.signal?.addEventListener("abort", onAbort, { once: true });
  const close = async () => {
    options.signal?.removeEventListener("abort", onAbort);
    await handle.close();
  };
  let report: ReaderReport | null = null;
  async function* batches(): AsyncGenerator<ReaderBatch, void, undefined> {
    try {
      for (;;) {
        const answer = await handle.ask({ kind: "next" });
        if (answer.kind === "end") {
          report = answer.report;
          return;
        }
        if (answer.kind === "batch") yield answer.batch;
      }
    } finally {
      await close();
    }
  }
  try {
    const answer = await handle.ask({ kind: "open", request });
    invariant(answer.kind === "header", "the reading process answers first with the header");
    const finished = (): ReaderReport => {
      invariant(report, "the report of a reading is there once all its batches are read");
      return report;
    };
    return { header: answer.header, batches: batches(), report: finished, close };
  } catch (error) {
    await close();
    throw error;
  }
}

/** Looks through a whole file for what must be asked before a preview. @throws RefusedFile */
export async function surveyFile(
  request: Omit<ReaderRequest, "mode" | "answers">,
  options: ReaderOptions & { onProgress?: (share: number, rows: number) => void } = {},
): Promise<{ header: FileHeader; report: ReaderReport }> {
  const opened = await openReader({ ...request, mode: "survey", answers: {} }, options);
  let rows = 0;
  for await (const batch of opened.batches) {
    rows += batch.rowsRead;
    options.onProgress?.(batch.share, rows);
  }
  return { header: opened.header, report: opened.report() };
}
