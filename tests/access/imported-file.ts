import { send } from "./visitors";

const FILE = [
  "system;point;parameter;value;unit;time",
  "KELP-01;;temperature;14.2;°C;2026-01-05 08:00",
  "KELP-01;;no_such_parameter;1;;2026-01-05 08:00",
].join("\n");

/** Imports a small file, so that there is an import to ask about. */
export async function importedFile(cookie: string): Promise<{ importId: string; importCode: string }> {
  const answer = await send(cookie, "/api/v1/imports?name=walk.csv", {
    method: "POST",
    body: FILE,
    headers: { "content-type": "application/octet-stream" },
  });
  const { data } = (await answer.json()) as { data?: { importId?: number; id?: number; code?: string } };
  const importId = data?.importId ?? data?.id;
  if (importId === undefined) throw new Error(`the file was not taken (${answer.status})`);
  const shown = await send(cookie, `/api/v1/imports/${importId}`);
  const { code } = ((await shown.json()) as { data: { code: string } }).data;
  return { importId: String(importId), importCode: code };
}
