import { command } from "@/app/_server/handle";
import { discardImport } from "@/modules/imports";

export const POST = command(discardImport);
