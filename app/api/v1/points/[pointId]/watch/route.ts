import { command } from "@/app/_server/handle";
import { planWatch } from "@/modules/measurements";

export const PUT = command(planWatch);
