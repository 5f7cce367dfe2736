import { command } from "@/app/_server/handle";
import { bindAreas } from "@/modules/identity";

export const PUT = command(bindAreas);
