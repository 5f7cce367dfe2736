"use client";
import { Refusal } from "@/app/_shell/refusal";
import { Button } from "@/lib/ui";

/** A fault of ours: says so, gives the number under which it was noted, and the way on. */
export default function PageFault({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <Refusal
      title="This page met a fault"
      actions={
        <Button variant="next" onClick={reset}>
          Try again
        </Button>
      }
    >
      <p>
        The fault is on our side and nothing you stored is affected.
        {error.digest !== undefined && (
          <>
            {" "}
            It has been noted under <span className="num">{error.digest}</span>: tell your administrator this
            number if it stays.
          </>
        )}
      </p>
    </Refusal>
  );
}
