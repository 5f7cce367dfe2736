import { query } from "@/app/_server/handle";
import { getLimitWorkbook } from "@/modules/measurements";

export const GET = query(getLimitWorkbook);
