import { route } from "@/app/_server/handle";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { ask } from "@/modules/audit";
import { getSeriesFrame, listSeriesFileSlice } from "@/modules/measurements";

type Slice = { readonly pointId: string; readonly parameterId: string };

const plain = (text: string): string => text.replaceAll(/[^\w.-]+/g, "-");

/** The series as a file, slice by slice, so that ten years of five minutes hold nobody up. */
export const GET = route(async ({ request, actor }) => {
  const from = () => ({ db: database().reader.orm, actor, at: systemClock.now() });
  const asked = Object.fromEntries(new URL(request.url).searchParams) as Slice;
  const first = ask(from(), listSeriesFileSlice, asked);
  const { pointId, parameterId } = asked;
  const frame = ask(from(), getSeriesFrame, { pointId, parameterId });
  const name = plain(`${frame.systemCode}-${frame.pointName}-${frame.parameter.code}`);
  const encoder = new TextEncoder();
  let slice: typeof first | null = first;
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      if (slice === null) return controller.close();
      controller.enqueue(encoder.encode(slice.text));
      slice = slice.next && ask(from(), listSeriesFileSlice, { ...asked, ...slice.next });
    },
  });
  return new Response(body, {
    headers: {
      "content-type": "text/csv; charset=utf-8",
      "content-disposition": `attachment; filename="${name}.csv"`,
      "cache-control": "no-store",
    },
  });
});
