import { command } from "@/app/_server/handle";
import { suspendPerson } from "@/modules/identity";

export const POST = command(suspendPerson);
