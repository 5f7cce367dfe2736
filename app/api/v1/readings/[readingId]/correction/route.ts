import { command } from "@/app/_server/handle";
import { correctReading } from "@/modules/measurements";

export const POST = command(correctReading);
