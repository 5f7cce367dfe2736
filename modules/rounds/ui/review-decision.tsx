"use client";
import { useState } from "react";
import { Button, ButtonRow } from "@/lib/ui";
import { shortHash } from "@/modules/signoff/model";
import type { ReviewOutcome, SheetCounts, SheetState } from "../model";
import { countWords, readingsWord } from "./sheet-words";
import { SignDialog } from "./sign-dialog";

export interface ReviewDecisionProps {
  areaId: number;
  areaName: string;
  onDay: string;
  /** The day, as it is written. */
  day: string;
  contentHash: string;
  counts: SheetCounts;
  state: SheetState;
  isOver: boolean;
  hindrances: readonly string[];
}

/** A lead's decision on one sheet, with what stands in its way in sentences. */
export function ReviewDecision(props: ReviewDecisionProps) {
  const { areaId, areaName, onDay, day, contentHash, counts, state, isOver, hindrances } = props;
  const [asked, setAsked] = useState<ReviewOutcome | null>(null);
  if (state === "reviewed") {
    return <p className="text-ink-2">This sheet is reviewed. A correction would ask for review again.</p>;
  }
  if (counts.readings === 0 && counts.gaps === 0) {
    return <p className="text-ink-2">There is nothing on this sheet to decide on.</p>;
  }
  const found = countWords(counts);
  return (
    <div className="grid gap-3">
      {hindrances.length > 0 && (
        <div>
          <p className="font-semibold">You cannot sign it as reviewed:</p>
          <ul className="list-disc pl-5">
            {hindrances.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </div>
      )}
      {!isOver && (
        <p className="text-ink-2">
          The operational day is not over: whatever is read later asks for review again.
        </p>
      )}
      <ButtonRow>
        {hindrances.length === 0 && (
          <Button variant="next" onClick={() => setAsked("reviewed")}>
            Sign as reviewed…
          </Button>
        )}
        <Button onClick={() => setAsked("returned")}>Return…</Button>
      </ButtonRow>
      <p className="text-sm text-ink-3">
        Signing asks for your password and binds name, time and meaning to this content (hash{" "}
        <span className="num">{shortHash(contentHash)}</span>).
      </p>
      {asked !== null && (
        <SignDialog outcome={asked} sheets={[{ areaId, onDay, contentHash }]} onClose={() => setAsked(null)}>
          <p>
            {areaName}, {day}: {readingsWord(counts.readings)}
            {found.length > 0 ? `; ${found.join(", ")}.` : ", nothing deviates."}
          </p>
        </SignDialog>
      )}
    </div>
  );
}
