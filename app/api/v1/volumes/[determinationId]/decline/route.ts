import { command } from "@/app/_server/handle";
import { declineVolume } from "@/modules/systems";

export const POST = command(declineVolume);
