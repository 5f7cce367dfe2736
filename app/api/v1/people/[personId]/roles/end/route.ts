import { command } from "@/app/_server/handle";
import { endRole } from "@/modules/identity";

export const POST = command(endRole);
