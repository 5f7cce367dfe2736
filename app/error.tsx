"use client";
import { PlainFrame } from "./_shell/plain-frame";
import { Refusal } from "./_shell/refusal";

/** A fault outside the signed-in pages. */
export default function SiteFault({ error }: { error: Error & { digest?: string } }) {
  return (
    <PlainFrame>
      <Refusal title="Something went wrong here">
        <p>
          The fault is on our side. Load the page again in a moment
          {error.digest !== undefined && (
            <>
              ; it has been noted under <span className="num">{error.digest}</span>
            </>
          )}
          .
        </p>
      </Refusal>
    </PlainFrame>
  );
}
