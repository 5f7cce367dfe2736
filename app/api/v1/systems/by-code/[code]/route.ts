import { query } from "@/app/_server/handle";
import { getSystem } from "@/modules/systems";

export const GET = query(getSystem);
