import { query } from "@/app/_server/handle";
import { getRecordHistory } from "@/modules/audit";

export const GET = query(getRecordHistory);
