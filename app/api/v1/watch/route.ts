import { query } from "@/app/_server/handle";
import { listWatch } from "@/modules/measurements";

export const GET = query(listWatch);
