import { command } from "@/app/_server/handle";
import { retireParameter } from "@/modules/methods";

export const POST = command(retireParameter);
