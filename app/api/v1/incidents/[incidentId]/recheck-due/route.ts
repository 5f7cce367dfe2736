import { command } from "@/app/_server/handle";
import { setRecheck } from "@/modules/quality";

export const POST = command(setRecheck);
