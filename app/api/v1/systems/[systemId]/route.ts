import { command } from "@/app/_server/handle";
import { editSystem } from "@/modules/systems";

export const PUT = command(editSystem);
