import { command } from "@/app/_server/handle";
import { repeatInvitation } from "@/modules/identity";

export const POST = command(repeatInvitation);
