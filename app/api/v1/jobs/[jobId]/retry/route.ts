import { command } from "@/app/_server/handle";
import { retryJob } from "@/modules/audit";

export const POST = command(retryJob);
