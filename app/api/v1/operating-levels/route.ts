import { command } from "@/app/_server/handle";
import { setOperatingLevel } from "@/modules/systems";

export const POST = command(setOperatingLevel);
