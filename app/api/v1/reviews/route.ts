import { command } from "@/app/_server/handle";
import { reviewDays } from "@/modules/rounds";

export const POST = command(reviewDays);
