import { query } from "@/app/_server/handle";
import { listSeriesSlice } from "@/modules/measurements";

export const GET = query(listSeriesSlice);
