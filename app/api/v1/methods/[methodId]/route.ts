import { command } from "@/app/_server/handle";
import { editMethod } from "@/modules/methods";

export const PUT = command(editMethod);
