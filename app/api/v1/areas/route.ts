import { command, query } from "@/app/_server/handle";
import { createArea, listAreas } from "@/modules/systems";

export const GET = query(listAreas);
export const POST = command(createArea);
