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
  for (let tries = 0; tries < 200; tries += 1) {
    const shown = await send(cookie, `/api/v1/imports/${importId}`);
    const { code, state } = ((await shown.json()) as { data: { code: string; state: string } }).data;
    // The file is looked through by a job; the walk begins when that is done.
    if (state !== "uploaded" && state !== "checking") return { importId: String(importId), importCode: code };
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error("the file was not looked through within 20 s");
}
