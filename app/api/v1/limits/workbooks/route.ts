import { command, query } from "@/app/_server/handle";
import { listLimitWorkbooks, proposeLimits } from "@/modules/measurements";

export const GET = query(listLimitWorkbooks);
export const POST = command(proposeLimits);
