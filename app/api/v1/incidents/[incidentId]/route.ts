import { query } from "@/app/_server/handle";
import { getIncident } from "@/modules/quality";

export const GET = query(getIncident);
