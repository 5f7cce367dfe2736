import type { Metadata } from "next";
import { lastDays } from "@/app/_server/facility-day";
import { personNames } from "@/app/_server/names";
import { askPage, pageActor } from "@/app/_server/session";
import { waitingFor } from "@/app/_server/waiting";
import { EmptyState, LinkButton, PageHead, Panel } from "@/lib/ui";
import { may } from "@/modules/access";
import { listDaySheets, roundsMay } from "@/modules/rounds";
import { ReviewList } from "@/modules/rounds/ui/review-list";
import { WaitingList } from "@/modules/rounds/ui/waiting-list";

export const metadata: Metadata = { title: "Review" };

/** How far back sheets are looked for. */
const DAYS_BACK = 14;

export default async function ReviewPage() {
  const actor = await pageActor();
  const sheets = await askPage(listDaySheets, { days: lastDays(DAYS_BACK).join(",") });
  const names = await personNames();
  const { decisions, own } = await waitingFor(actor, names);
  const mayReview = may(actor, roundsMay.review);
  const waiting = sheets.filter(
    ({ state, counts }) => state !== "reviewed" && counts.readings + counts.gaps > 0,
  );
  const finished = waiting.filter((sheet) => sheet.isOver && sheet.state !== "returned");
  return (
    <>
      <PageHead
        title="Review"
        facts={
          mayReview
            ? "A second look at each day, with your name under it. What deviates is counted here and stands first on each sheet."
            : "What waits for a lead's second look, and what of yours waits for whom."
        }
        waiting={
          mayReview && finished.length + decisions.length > 0
            ? [
                finished.length > 0 && `${finished.length} day ${finished.length === 1 ? "sheet" : "sheets"}`,
                decisions.length > 0 &&
                  `${decisions.length} other ${decisions.length === 1 ? "decision" : "decisions"}`,
              ]
                .filter(Boolean)
                .join(" and ")
            : undefined
        }
      />
      <div className="grid gap-5">
        <WaitingList title="Decisions that wait for you" items={decisions} />
        <WaitingList title="Yours" items={own} />
        <Panel title="Day sheets" aside={`not reviewed, of the last ${DAYS_BACK} days`}>
          {waiting.length === 0 ? (
            <EmptyState
              title="Nothing waits for review"
              actions={<LinkButton href="/rounds">To the rounds</LinkButton>}
            >
              <p>
                Each area's readings of a day make one sheet. As soon as something is read, or corrected after
                it was reviewed, its sheet stands here until a lead signs it.
              </p>
            </EmptyState>
          ) : (
            <ReviewList
              mayReview={mayReview}
              rows={waiting.map((sheet) => ({
                areaId: sheet.areaId,
                areaCode: sheet.areaCode,
                areaName: sheet.areaName,
                onDay: sheet.onDay,
                isOver: sheet.isOver,
                contentHash: sheet.contentHash,
                counts: sheet.counts,
                state: sheet.state,
                comment: sheet.comment,
                hindrances: mayReview ? sheet.hindrances : [],
              }))}
            />
          )}
        </Panel>
      </div>
    </>
  );
}
