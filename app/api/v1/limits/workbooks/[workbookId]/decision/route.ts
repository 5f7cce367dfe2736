import { command } from "@/app/_server/handle";
import { decideLimits } from "@/modules/measurements";

export const POST = command(decideLimits);
