import { command } from "@/app/_server/handle";
import { recordInstrumentCheck } from "@/modules/methods";

export const POST = command(recordInstrumentCheck);
