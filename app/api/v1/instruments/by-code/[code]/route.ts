import { query } from "@/app/_server/handle";
import { getInstrument } from "@/modules/methods";

export const GET = query(getInstrument);
