import { command } from "@/app/_server/handle";
import { decideRole } from "@/modules/identity";

export const POST = command(decideRole);
