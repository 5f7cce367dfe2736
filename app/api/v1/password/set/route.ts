import { route } from "@/app/_server/handle";
import { addressOf, readBody } from "@/app/_server/request";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { setPasswordByLink } from "@/modules/identity";

export const POST = route(
  async ({ request }) => {
    const data = await setPasswordByLink(
      database(),
      systemClock,
      await readBody(request),
      addressOf(request.headers),
    );
    return Response.json({ data });
  },
  { open: true },
);
