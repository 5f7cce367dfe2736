import { query } from "@/app/_server/handle";
import { listStagedRows } from "@/modules/imports";

export const GET = query(listStagedRows);
