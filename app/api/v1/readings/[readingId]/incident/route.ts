import { query } from "@/app/_server/handle";
import { incidentOfReading } from "@/modules/quality";

export const GET = query(incidentOfReading);
