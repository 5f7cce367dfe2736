import { command } from "@/app/_server/handle";
import { editParameter } from "@/modules/methods";

export const PUT = command(editParameter);
