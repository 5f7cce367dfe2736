import { command } from "@/app/_server/handle";
import { answerQuestions } from "@/modules/imports";

export const POST = command(answerQuestions);
