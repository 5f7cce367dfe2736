import { query } from "@/app/_server/handle";
import { getReading } from "@/modules/measurements";

export const GET = query(getReading);
