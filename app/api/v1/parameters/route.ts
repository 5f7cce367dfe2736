import { command, query } from "@/app/_server/handle";
import { createParameter, listParameters } from "@/modules/methods";

export const GET = query(listParameters);
export const POST = command(createParameter);
