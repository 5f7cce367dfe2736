import { command, query } from "@/app/_server/handle";
import { listReadings, recordReadings } from "@/modules/measurements";

export const GET = query(listReadings);
export const POST = command(recordReadings);
