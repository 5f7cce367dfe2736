import type { FieldProblem, ProblemDocument } from "@/lib/problem";

/** A refusal of the server, as it came (RFC 9457). `message` is a sentence for a person. */
export class ApiProblem extends Error {
  readonly status: number;
  readonly title: string;
  /** The last part of the problem's type, for example "own-work". */
  readonly code: string;
  readonly instance: string | undefined;
  readonly errors: readonly FieldProblem[];
  /** Whatever else the document carried. */
  readonly document: Readonly<Record<string, unknown>>;

  constructor(document: ProblemDocument & Record<string, unknown>) {
    super(document.detail || document.title);
    this.name = "ApiProblem";
    this.status = document.status;
    this.title = document.title;
    this.code = document.type.split(/[:/#]/).at(-1) ?? "unknown";
    this.instance = document.instance;
    this.errors = document.errors ?? [];
    this.document = document;
  }
}

/** The server was not reached, so it is not known whether it heard us; sending again with the same key is safe. */
export class NetworkProblem extends Error {
  constructor(cause: unknown) {
    super(
      "The server cannot be reached. What you entered is still here: check the network, then send it again; nothing is stored twice.",
      { cause },
    );
    this.name = "NetworkProblem";
  }
}

export interface SendOptions {
  /** The same key for every try of one act; without it each call is a new act. */
  idempotencyKey?: string;
  method?: "POST" | "PUT" | "PATCH" | "DELETE";
  signal?: AbortSignal;
}

/**
 * Sends one command and gives back what it answered. A FormData body goes as it is (uploads), anything else as JSON.
 * @throws ApiProblem when the server refuses, NetworkProblem when it is not reached
 */
export async function sendCommand<Answer = unknown>(
  path: string,
  body: unknown,
  { idempotencyKey = crypto.randomUUID(), method = "POST", signal }: SendOptions = {},
): Promise<Answer> {
  const isForm = typeof FormData !== "undefined" && body instanceof FormData;
  const headers: Record<string, string> = {
    Accept: "application/json, application/problem+json",
    "Idempotency-Key": idempotencyKey,
  };
  if (!isForm) headers["Content-Type"] = "application/json";
  return ask<Answer>(path, { method, headers, body: isForm ? body : JSON.stringify(body ?? {}), signal });
}

/**
 * Reads JSON from the server.
 * @throws ApiProblem when the server refuses, NetworkProblem when it is not reached
 */
export async function fetchJson<Answer = unknown>(path: string, signal?: AbortSignal): Promise<Answer> {
  return ask<Answer>(path, { headers: { Accept: "application/json, application/problem+json" }, signal });
}

async function ask<Answer>(path: string, init: RequestInit): Promise<Answer> {
  let response: Response;
  let text: string;
  try {
    response = await fetch(path, { credentials: "same-origin", cache: "no-store", ...init });
    text = await response.text();
  } catch (error) {
    if (init.signal?.aborted) throw error;
    throw new NetworkProblem(error);
  }
  const json = parse(text);
  if (!response.ok) throw new ApiProblem(toDocument(json, response));
  if (json === undefined && text.trim() !== "") {
    throw new ApiProblem(
      unexpected(response, "The server answered with something that is not data. Load the page again."),
    );
  }
  return json as Answer;
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

/** Reads a problem document leniently: whatever is missing gets a sentence, so that no refusal is ever mute. */
function toDocument(json: unknown, response: Response): ProblemDocument & Record<string, unknown> {
  if (typeof json !== "object" || json === null) {
    const detail =
      response.status >= 500
        ? "The server met a fault of its own and stored nothing from this. Try again; if it goes on, tell your administrator."
        : `The server refused this (${response.status}) without saying why. Tell your administrator.`;
    return unexpected(response, detail);
  }
  const found = json as Record<string, unknown>;
  const text = (key: string) => (typeof found[key] === "string" ? (found[key] as string) : "");
  const title = text("title") || "The server refused this";
  return {
    ...found,
    type: text("type") || "about:blank",
    title,
    status: typeof found.status === "number" ? found.status : response.status,
    detail: text("detail") || title,
    instance: text("instance") || undefined,
    errors: Array.isArray(found.errors) ? found.errors.filter(isFieldProblem) : [],
  };
}

function isFieldProblem(value: unknown): value is FieldProblem {
  if (typeof value !== "object" || value === null) return false;
  const { pointer, detail } = value as Record<string, unknown>;
  return typeof pointer === "string" && typeof detail === "string";
}

function unexpected(response: Response, detail: string): ProblemDocument & Record<string, unknown> {
  return { type: "about:blank", title: "Something went wrong", status: response.status, detail };
}
