import { command } from "@/app/_server/handle";
import { voidReading } from "@/modules/measurements";

export const POST = command(voidReading);
