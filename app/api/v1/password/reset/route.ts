import { setTimeout } from "node:timers/promises";
import { route } from "@/app/_server/handle";
import { addressOf, readBody } from "@/app/_server/request";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { askForReset } from "@/modules/identity";

/** Writing a letter takes a moment; without an account the answer takes as long. */
const ANSWER_AFTER_MS = 400;

/** Answers the same, and after the same time, whether or not there is such an account. */
export const POST = route(
  async ({ request }) => {
    const moment = setTimeout(ANSWER_AFTER_MS);
    askForReset(database(), systemClock, await readBody(request), addressOf(request.headers));
    await moment;
    return Response.json({ data: {} });
  },
  { open: true },
);
