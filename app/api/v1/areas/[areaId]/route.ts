import { command } from "@/app/_server/handle";
import { editArea } from "@/modules/systems";

export const PUT = command(editArea);
