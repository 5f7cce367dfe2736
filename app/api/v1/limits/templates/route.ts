import { command, query } from "@/app/_server/handle";
import { listLimitTemplates, saveLimitTemplate } from "@/modules/measurements";

export const GET = query(listLimitTemplates);
export const POST = command(saveLimitTemplate);
