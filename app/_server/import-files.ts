import "server-only";
import { Readable } from "node:stream";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { Problem } from "@/lib/problem";
import { diskStore } from "@/lib/storage";
import { ask, mustBeAllowed } from "@/modules/audit";
import {
  getImport,
  getOriginal,
  importsMay,
  listStagedRows,
  receiveUpload,
  rejectLine,
  rejectsHead,
} from "@/modules/imports";
import type { Asked } from "./handle";

const REJECTS_AT_ONCE = 500;

const attachment = (name: string, type: string): Record<string, string> => ({
  "content-type": type,
  "content-disposition": `attachment; filename*=UTF-8''${encodeURIComponent(name)}`,
  "cache-control": "no-store",
});

/** Takes a file as the raw body of the request, its name in `?name=`; streamed to the disk, never held whole. */
export async function takeUpload({ request, actor, requestId }: Asked): Promise<Response> {
  mustBeAllowed(actor, importsMay.upload);
  const type = (request.headers.get("content-type") ?? "").toLowerCase();
  if (type.startsWith("multipart/") || type.startsWith("application/json")) {
    throw new Problem(
      "wrong-type",
      "Send the file itself as the body, with the content type application/octet-stream and its name as ?name=.",
    );
  }
  const declared = request.headers.get("content-length");
  const data = await receiveUpload(
    {
      db: database(),
      actor,
      clock: systemClock,
      requestId,
      idempotencyKey: request.headers.get("idempotency-key"),
    },
    {
      name: new URL(request.url).searchParams.get("name") ?? "",
      body: request.body,
      declaredBytes: declared === null ? null : Number(declared),
    },
  );
  return Response.json({ data }, { status: 201, headers: { "cache-control": "no-store" } });
}

/** What was refused, as a file that can be mended and imported again. */
export function sendRejects({ actor, params }: Asked): Promise<Response> {
  const from = { db: database().reader.orm, actor, at: systemClock.now() };
  const importId = String(params.importId);
  const { code } = ask(from, getImport, { importId });
  const encoder = new TextEncoder();
  let after: number | null = 0;
  const body = new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(encoder.encode(rejectsHead())),
    pull(controller) {
      if (after === null) return controller.close();
      const page = ask(from, listStagedRows, { importId, outcome: "refused", after, limit: REJECTS_AT_ONCE });
      if (page.rows.length > 0) controller.enqueue(encoder.encode(page.rows.map(rejectLine).join("")));
      after = page.next;
      if (after === null) controller.close();
    },
  });
  return Promise.resolve(
    new Response(body, { headers: attachment(`${code}-refused.csv`, "text/csv; charset=utf-8") }),
  );
}

/** The file as it came, byte for byte. */
export async function sendOriginal({ actor, params }: Asked): Promise<Response> {
  const from = { db: database().reader.orm, actor, at: systemClock.now() };
  const original = ask(from, getOriginal, { importId: String(params.importId) });
  const { stream, bytes } = await diskStore(settings().dataFolder).read(original.storedPath);
  return new Response(Readable.toWeb(stream) as ReadableStream<Uint8Array>, {
    headers: {
      ...attachment(original.fileName, "application/octet-stream"),
      "content-length": String(bytes),
    },
  });
}
