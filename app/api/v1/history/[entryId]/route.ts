import { query } from "@/app/_server/handle";
import { getEntry } from "@/modules/audit";

export const GET = query(getEntry);
