import { command } from "@/app/_server/handle";
import { setOwner } from "@/modules/quality";

export const POST = command(setOwner);
