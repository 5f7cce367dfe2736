import { route } from "@/app/_server/handle";
import { mustBeAllowed } from "@/modules/audit";
import { importsMay, templateCsv } from "@/modules/imports";

/** An example of a file that can be imported. */
export const GET = route(({ actor }) => {
  mustBeAllowed(actor, importsMay.upload);
  return Promise.resolve(
    new Response(templateCsv(), {
      headers: {
        "content-type": "text/csv; charset=utf-8",
        "content-disposition": 'attachment; filename="readings-template.csv"',
        "cache-control": "no-store",
      },
    }),
  );
});
