import { route } from "@/app/_server/handle";
import { readBody } from "@/app/_server/request";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { changeOwnPassword } from "@/modules/identity";

export const POST = route(async ({ request, actor }) => {
  await changeOwnPassword(database(), systemClock, actor, await readBody(request));
  return Response.json({ data: {} });
});
