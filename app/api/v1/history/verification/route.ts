import { command, query } from "@/app/_server/handle";
import { askForVerification, getVerification } from "@/modules/audit";

export const GET = query(getVerification);
export const POST = command(askForVerification);
