"use client";

/** The last resort, where even the frame of the page failed: plain words without any style of its own. */
export default function WholeSiteFault({ error }: { error: Error & { digest?: string } }) {
  return (
    <html lang="en-GB">
      <body>
        <main>
          <h1>Stillwell met a fault</h1>
          <p>
            The fault is on our side. Load the page again in a moment.{" "}
            {error.digest && `Noted as ${error.digest}.`}
          </p>
        </main>
      </body>
    </html>
  );
}
