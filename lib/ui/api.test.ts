import { afterEach, describe, expect, it, vi } from "vitest";
import { ApiProblem, fetchJson, NetworkProblem, sendCommand } from "./api";

const answer = (body: string, status = 200) =>
  vi.fn(async (_url: string, _init: RequestInit) => new Response(body, { status }));
afterEach(() => vi.unstubAllGlobals());

const caught = async (promise: Promise<unknown>) =>
  promise.then(
    () => null,
    (error: unknown) => error,
  );

describe("talking to the server", () => {
  it("sends a command as JSON under the key it was given", async () => {
    const fetch = answer('{"id":7}');
    vi.stubGlobal("fetch", fetch);
    expect(await sendCommand("/api/v1/x", { a: 1 }, { idempotencyKey: "k-1" })).toEqual({ id: 7 });
    const init = fetch.mock.calls[0]?.[1];
    expect(init).toMatchObject({ method: "POST", body: '{"a":1}', credentials: "same-origin" });
    expect(init?.headers).toMatchObject({ "Idempotency-Key": "k-1", "Content-Type": "application/json" });
  });

  it("gives each act a key of its own when none is given", async () => {
    const fetch = answer("{}");
    vi.stubGlobal("fetch", fetch);
    await sendCommand("/x", {});
    await sendCommand("/x", {});
    const keys = fetch.mock.calls.map(([, init]) => new Headers(init.headers).get("Idempotency-Key"));
    expect(keys[0]).toMatch(/^[0-9a-f-]{36}$/);
    expect(keys[0]).not.toBe(keys[1]);
  });

  it("turns a problem document into a problem with its errors by pointer", async () => {
    const errors = [{ pointer: "/value", code: "not-a-number", detail: "Type a number." }];
    vi.stubGlobal(
      "fetch",
      answer(
        JSON.stringify({ type: "urn:x:problem:invalid", title: "T", status: 422, detail: "D", errors }),
        422,
      ),
    );
    const problem = await caught(sendCommand("/x", {}));
    expect(problem).toBeInstanceOf(ApiProblem);
    expect(problem).toMatchObject({ status: 422, code: "invalid", message: "D", errors });
  });

  it("has a sentence for a refusal that is not a document, and for an answer that is not data", async () => {
    vi.stubGlobal("fetch", answer("<html>bad gateway", 502));
    expect(await caught(fetchJson("/x"))).toMatchObject({
      status: 502,
      message: expect.stringContaining("Try again"),
    });
    vi.stubGlobal("fetch", answer("<html>sign in", 200));
    expect(await caught(fetchJson("/x"))).toBeInstanceOf(ApiProblem);
  });

  it("tells a missing network from a refusal", async () => {
    vi.stubGlobal(
      "fetch",
      vi.fn(async () => Promise.reject(new TypeError("fetch failed"))),
    );
    const problem = await caught(sendCommand("/x", {}));
    expect(problem).toBeInstanceOf(NetworkProblem);
    expect(problem).not.toBeInstanceOf(ApiProblem);
  });

  it("lets an abort be an abort", async () => {
    const stop = new AbortController();
    stop.abort();
    vi.stubGlobal(
      "fetch",
      vi.fn(async () => Promise.reject(new DOMException("aborted", "AbortError"))),
    );
    expect(await caught(fetchJson("/x", stop.signal))).toMatchObject({ name: "AbortError" });
  });

  it("accepts an empty answer", async () => {
    vi.stubGlobal("fetch", answer(""));
    expect(await sendCommand("/x", {})).toBeUndefined();
  });
});
