import { command } from "@/app/_server/handle";
import { explainReading } from "@/modules/measurements";

export const POST = command(explainReading);
