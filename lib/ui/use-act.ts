"use client";
import { useRouter } from "next/navigation";
import { useCallback, useRef, useState } from "react";
import { ApiProblem, NetworkProblem, sendCommand } from "./api";
import { useLiveMessage } from "./live-message";

export interface ActOptions {
  method?: "POST" | "PUT" | "PATCH" | "DELETE";
  /** What is said when it is done. */
  done: string;
  /** Runs after it is done, before the page is asked anew. */
  then?: () => void;
}

/**
 * One press, one act: sends it, says that it is done, and asks the page's data anew. A refusal is said at the foot of the
 * page and given back in `problem`. The key stays the same until the server has answered, so a second press does nothing twice.
 */
export function useAct(): {
  act: (path: string, body: unknown, options: ActOptions) => Promise<boolean>;
  busy: boolean;
  problem: ApiProblem | NetworkProblem | null;
} {
  const router = useRouter();
  const say = useLiveMessage();
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiProblem | NetworkProblem | null>(null);
  const key = useRef<{ path: string; value: string } | null>(null);

  const act = useCallback(
    async (path: string, body: unknown, { method, done, then }: ActOptions) => {
      if (key.current?.path !== path) key.current = { path, value: crypto.randomUUID() };
      setBusy(true);
      setProblem(null);
      try {
        await sendCommand(path, body, { method, idempotencyKey: key.current.value });
        key.current = null;
        then?.();
        say({ text: done });
        router.refresh();
        return true;
      } catch (error) {
        if (!(error instanceof ApiProblem || error instanceof NetworkProblem)) throw error;
        if (error instanceof ApiProblem && error.status < 500) key.current = null;
        setProblem(error);
        say({ text: error.message, kind: "trouble" });
        return false;
      } finally {
        setBusy(false);
      }
    },
    [router, say],
  );
  return { act, busy, problem };
}
