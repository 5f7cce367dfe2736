import { command, query } from "@/app/_server/handle";
import { createMethod, listMethods } from "@/modules/methods";

export const GET = query(listMethods);
export const POST = command(createMethod);
