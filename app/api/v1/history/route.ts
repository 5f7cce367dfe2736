import { query } from "@/app/_server/handle";
import { listEntries } from "@/modules/audit";

export const GET = query(listEntries);
