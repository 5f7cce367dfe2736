import { route } from "@/app/_server/handle";
import { sendRejects } from "@/app/_server/import-files";

export const GET = route(sendRejects);
