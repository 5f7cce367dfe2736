import { command, query } from "@/app/_server/handle";
import { addEquipment, listEquipment } from "@/modules/systems";

export const GET = query(listEquipment);
export const POST = command(addEquipment);
