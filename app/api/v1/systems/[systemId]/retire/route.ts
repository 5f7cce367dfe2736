import { command } from "@/app/_server/handle";
import { retireSystem } from "@/modules/systems";

export const POST = command(retireSystem);
