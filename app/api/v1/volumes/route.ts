import { command, query } from "@/app/_server/handle";
import { proposeVolume, volumeOf } from "@/modules/systems";

export const GET = query(volumeOf);
export const POST = command(proposeVolume);
