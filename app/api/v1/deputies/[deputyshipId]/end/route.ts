import { command } from "@/app/_server/handle";
import { endDeputy } from "@/modules/identity";

export const POST = command(endDeputy);
