"use client";
import { Button, useAct } from "@/lib/ui";
import { useRefreshWhile } from "./use-refresh-while";

/** Asks for a check of the whole history; while one is under way the page looks for its result by itself. */
export function AskForCheck({ underWay }: { underWay: boolean }) {
  const { act, busy } = useAct();
  useRefreshWhile(underWay);
  return (
    <Button
      variant="next"
      busy={busy || underWay}
      busyText="A check is under way"
      onClick={() =>
        void act(
          "/api/v1/history/verification",
          {},
          { done: "The check has begun; its result will stand below." },
        )
      }
    >
      Check it now
    </Button>
  );
}
