import { query } from "@/app/_server/handle";
import { getDaySheet } from "@/modules/rounds";

export const GET = query(getDaySheet);
