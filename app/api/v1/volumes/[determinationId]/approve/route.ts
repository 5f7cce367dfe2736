import { command } from "@/app/_server/handle";
import { approveVolume } from "@/modules/systems";

export const POST = command(approveVolume);
