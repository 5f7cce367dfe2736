"use client";
import { useRef, useState } from "react";
import type { z } from "zod";
import { ApiProblem, NetworkProblem, sendCommand } from "@/lib/ui";
import type { proposeVolumeInput } from "../input";

/** Sends a proposed volume; the same key until one try succeeds, so that a second press proposes nothing twice. */
export function useProposal(onDone: (text: string) => void) {
  const [problem, setProblem] = useState<ApiProblem | NetworkProblem | null>(null);
  const [sending, setSending] = useState(false);
  const key = useRef<string | null>(null);

  const send = async (proposal: z.input<typeof proposeVolumeInput>) => {
    key.current ??= crypto.randomUUID();
    setProblem(null);
    setSending(true);
    try {
      await sendCommand("/api/v1/volumes", proposal, { idempotencyKey: key.current });
      key.current = null;
      onDone("The volume is proposed; another person, a lead, approves it.");
    } catch (error) {
      if (!(error instanceof ApiProblem || error instanceof NetworkProblem)) throw error;
      if (error instanceof ApiProblem && error.status < 500) key.current = null;
      setProblem(error);
    } finally {
      setSending(false);
    }
  };
  return { problem, sending, send };
}
