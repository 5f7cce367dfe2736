/**
 * Entry of the process that reads files nobody trusts. Its parent gives it one file, asks for batch after batch,
 * and may end it at any moment; memory and time are limited from outside.
 */
import type { FromReader, ReaderRequest, ToReader } from "@/modules/imports/reader/messages";
import { ReadingSession } from "@/modules/imports/reader/reading-session";
import { RefusedFile } from "@/modules/imports/rules/refused-file";

let session: ReadingSession | null = null;

function send(message: FromReader): void {
  process.send?.(message);
}

function sendFailure(error: unknown): void {
  if (error instanceof RefusedFile) send({ kind: "refused", refusal: error.refusal });
  else
    send({ kind: "failed", detail: error instanceof Error ? (error.stack ?? error.message) : String(error) });
}

async function open(request: ReaderRequest): Promise<void> {
  session = await ReadingSession.open(request);
  send({ kind: "header", header: session.header });
}

async function next(): Promise<void> {
  const batch = (await session?.next()) ?? null;
  if (batch) {
    send({ kind: "batch", batch });
    return;
  }
  const { rows, survey } = session?.end() ?? { rows: 0, survey: null };
  send({ kind: "end", report: { rows, survey, peakRssBytes: process.resourceUsage().maxRSS * 1024 } });
}

process.on("message", (message: ToReader) => {
  (message.kind === "open" ? open(message.request) : next()).catch(sendFailure);
});
process.on("disconnect", () => process.exit(0));
