import { command, query } from "@/app/_server/handle";
import { listIncidents, openIncident } from "@/modules/quality";

export const GET = query(listIncidents);
export const POST = command(openIncident);
