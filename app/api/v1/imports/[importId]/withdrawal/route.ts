import { command } from "@/app/_server/handle";
import { withdrawImport } from "@/modules/imports";

export const POST = command(withdrawImport);
