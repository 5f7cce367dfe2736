import { query } from "@/app/_server/handle";
import { listPersonNames } from "@/modules/identity";

export const GET = query(listPersonNames);
