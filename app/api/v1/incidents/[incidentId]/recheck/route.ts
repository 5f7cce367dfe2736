import { command } from "@/app/_server/handle";
import { recordRecheck } from "@/modules/quality";

export const POST = command(recordRecheck);
