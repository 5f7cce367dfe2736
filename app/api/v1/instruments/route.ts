import { command, query } from "@/app/_server/handle";
import { createInstrument, listInstruments } from "@/modules/methods";

export const GET = query(listInstruments);
export const POST = command(createInstrument);
