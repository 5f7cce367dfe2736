import { query } from "@/app/_server/handle";
import { listDaySheets } from "@/modules/rounds";

export const GET = query(listDaySheets);
