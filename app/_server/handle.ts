import "server-only";
import { randomUUID } from "node:crypto";
import type { z } from "zod";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { log } from "@/lib/log";
import { Problem } from "@/lib/problem";
import { type Actor, SYSTEM_ACTOR } from "@/modules/access";
import { ask, type Command, mustBeAllowed, parseInput, type Query, runCommand } from "@/modules/audit";
import { confirmPassword } from "@/modules/identity";
import { mustComeFromHere, readBody } from "./request";
import { prepareRuntime } from "./runtime";
import { requestActor } from "./session";

type RouteContext = { params: Promise<Record<string, string | string[] | undefined>> };
export type RouteHandler = (request: Request, context: RouteContext) => Promise<Response>;

/** What a handler is given once it is known who asks. */
export type Asked = { request: Request; actor: Actor; params: Record<string, unknown>; requestId: string };

const JSON_HEADERS = { "cache-control": "no-store" };

function refusal(problem: Problem, requestId: string): Response {
  return Response.json(problem.toDocument(`urn:uuid:${requestId}`), {
    status: problem.status,
    headers: { ...JSON_HEADERS, "content-type": "application/problem+json", "x-request-id": requestId },
  });
}

/** Turns whatever was thrown into an answer: a Problem as it is, anything else logged and shown as 500 with nothing inside. */
export function answerFault(
  cause: unknown,
  request: Request,
  requestId: string,
  actor: Actor | null,
): Response {
  const where = {
    requestId,
    method: request.method,
    path: new URL(request.url).pathname,
    person: actor?.personId ?? null,
  };
  if (cause instanceof Problem) {
    log().info({ ...where, code: cause.code, status: cause.status }, "refused");
    return refusal(cause, requestId);
  }
  log().error({ ...where, err: cause }, "failed");
  const body = { type: "urn:stillwell:problem:fault", title: "Something went wrong here", status: 500 };
  const detail = `The fault has been noted as ${requestId}. What you sent was not taken; send it again.`;
  return Response.json(
    { ...body, detail },
    {
      status: 500,
      headers: { ...JSON_HEADERS, "content-type": "application/problem+json", "x-request-id": requestId },
    },
  );
}

/** The frame of every route: request id, origin, who asks, faults. `open` routes are for people who are not signed in. */
export function route(
  perform: (asked: Asked) => Promise<Response>,
  options: { open?: boolean } = {},
): RouteHandler {
  return async (request, context) => {
    const requestId = randomUUID();
    let actor: Actor | null = null;
    try {
      prepareRuntime();
      if (request.method !== "GET" && request.method !== "HEAD") mustComeFromHere(request);
      actor = options.open ? SYSTEM_ACTOR : await requestActor();
      const response = await perform({ request, actor, params: await context.params, requestId });
      response.headers.set("x-request-id", requestId);
      return response;
    } catch (cause) {
      return answerFault(cause, request, requestId, actor);
    }
  };
}

/** Whether a signature's password is the actor's; asked last, so that only a signature that could be made costs a try. */
async function isOwnPassword<S extends z.ZodType>(
  actor: Actor,
  what: Command<S>,
  input: unknown,
  password: unknown,
): Promise<boolean> {
  if (typeof password !== "string" || actor.personId === null) return false;
  parseInput(what.input, input);
  return confirmPassword(database(), systemClock, actor.personId, password);
}

/**
 * A route that carries out one command: JSON in, JSON out. Path parameters are merged into the input. Whoever may not do it
 * at all is refused before the body is read.
 */
export function command<S extends z.ZodType, R>(what: Command<S, R>): RouteHandler {
  return route(async ({ request, actor, params, requestId }) => {
    mustBeAllowed(actor, what.permission);
    const { password, ...sent } = await readBody(request);
    const input = { ...sent, ...(what.signed || password === undefined ? {} : { password }), ...params };
    const passwordConfirmed = what.signed ? await isOwnPassword(actor, what, input, password) : false;
    const answer = runCommand(database(), actor, what, input as z.input<S>, {
      clock: systemClock,
      requestId,
      idempotencyKey: request.headers.get("idempotency-key"),
      passwordConfirmed,
    });
    return Response.json(
      { data: answer.result, entryId: answer.entryId, replayed: answer.replayed },
      { status: 200, headers: JSON_HEADERS },
    );
  });
}

/** A route that answers one question: search and path parameters in, JSON out. */
export function query<S extends z.ZodType, R>(what: Query<S, R>): RouteHandler {
  return route(async ({ request, actor, params }) => {
    const input = { ...Object.fromEntries(new URL(request.url).searchParams), ...params };
    const from = { db: database().reader.orm, actor, at: systemClock.now() };
    return Response.json({ data: ask(from, what, input as z.input<S>) }, { headers: JSON_HEADERS });
  });
}
