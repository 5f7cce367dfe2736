import { command } from "@/app/_server/handle";
import { editPoint } from "@/modules/systems";

export const PUT = command(editPoint);
