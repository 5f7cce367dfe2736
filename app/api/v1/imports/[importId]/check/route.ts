import { command } from "@/app/_server/handle";
import { startCheck } from "@/modules/imports";

export const POST = command(startCheck);
