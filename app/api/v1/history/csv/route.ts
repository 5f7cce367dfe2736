import { type Asked, route } from "@/app/_server/handle";
import { historyCsv } from "@/app/_server/history-csv";
import { readHistorySearch, searchOf } from "@/app/_server/history-search";
import { systemClock } from "@/lib/clock";
import { Problem } from "@/lib/problem";
import { auditMay, mustBeAllowed } from "@/modules/audit";

/** The history that a search finds, as a file; the same search as on the page. */
function answer({ request, actor }: Asked): Promise<Response> {
  mustBeAllowed(actor, auditMay.readHistory);
  const given = Object.fromEntries(new URL(request.url).searchParams);
  const { filter, problems } = readHistorySearch(searchOf(given));
  if (problems.length > 0) throw new Problem("invalid", problems.join(" "));
  const now = systemClock.now();
  const day = new Date(now).toISOString().slice(0, 10);
  return Promise.resolve(
    new Response(historyCsv({ actor, at: now }, filter), {
      headers: {
        "content-type": "text/csv; charset=utf-8",
        "content-disposition": `attachment; filename="history-${day}.csv"`,
        "cache-control": "no-store",
      },
    }),
  );
}

export const GET = route(answer);
