import { command } from "@/app/_server/handle";
import { joinReading } from "@/modules/quality";

export const POST = command(joinReading);
