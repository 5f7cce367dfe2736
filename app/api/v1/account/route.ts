import { query } from "@/app/_server/handle";
import { getOwnAccount } from "@/modules/identity";

export const GET = query(getOwnAccount);
