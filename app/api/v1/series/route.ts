import { query } from "@/app/_server/handle";
import { getSeries } from "@/modules/measurements";

export const GET = query(getSeries);
