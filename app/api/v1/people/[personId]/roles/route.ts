import { command } from "@/app/_server/handle";
import { grantRole } from "@/modules/identity";

export const POST = command(grantRole);
