import { command } from "@/app/_server/handle";
import { editEquipment } from "@/modules/systems";

export const PUT = command(editEquipment);
