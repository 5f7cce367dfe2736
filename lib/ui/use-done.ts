"use client";
import { useRouter } from "next/navigation";
import { useCallback } from "react";
import { useLiveMessage } from "./live-message";

/** After an act: says what was done and loads what the page shows anew. */
export function useDone(): (text: string) => void {
  const router = useRouter();
  const say = useLiveMessage();
  return useCallback(
    (text) => {
      say({ text });
      router.refresh();
    },
    [router, say],
  );
}
