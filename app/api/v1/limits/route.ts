import { query } from "@/app/_server/handle";
import { listLimits } from "@/modules/measurements";

export const GET = query(listLimits);
