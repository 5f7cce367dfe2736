import { command } from "@/app/_server/handle";
import { confirmReading } from "@/modules/measurements";

export const POST = command(confirmReading);
