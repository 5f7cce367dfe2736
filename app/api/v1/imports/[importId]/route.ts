import { query } from "@/app/_server/handle";
import { getImport } from "@/modules/imports";

export const GET = query(getImport);
