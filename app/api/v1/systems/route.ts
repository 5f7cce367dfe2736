import { command, query } from "@/app/_server/handle";
import { createSystem, listSystems } from "@/modules/systems";

export const GET = query(listSystems);
export const POST = command(createSystem);
