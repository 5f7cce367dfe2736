import { command } from "@/app/_server/handle";
import { startCommit } from "@/modules/imports";

export const POST = command(startCommit);
