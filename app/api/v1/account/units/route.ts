import { command } from "@/app/_server/handle";
import { preferUnits } from "@/modules/identity";

export const PUT = command(preferUnits);
