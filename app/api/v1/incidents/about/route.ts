import { query } from "@/app/_server/handle";
import { findOpenIncident } from "@/modules/quality";

export const GET = query(findOpenIncident);
