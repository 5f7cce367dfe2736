import { query } from "@/app/_server/handle";
import { getRecordAt } from "@/modules/audit";

export const GET = query(getRecordAt);
