import { command, query } from "@/app/_server/handle";
import { addPoint, listPoints } from "@/modules/systems";

export const GET = query(listPoints);
export const POST = command(addPoint);
