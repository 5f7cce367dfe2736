import { command } from "@/app/_server/handle";
import { editInstrument } from "@/modules/methods";

export const PUT = command(editInstrument);
